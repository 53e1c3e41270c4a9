package org.shearbook.desk.staff.web;

import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.staff.DeskHolding;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.PersonBook;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The page People and Keys: who works here and in which roles. */
@Controller
class PeopleController {

    private final PersonBook people;
    private final DeskHoldingBook holdings;

    PeopleController(PersonBook people, DeskHoldingBook holdings) {
        this.people = people;
        this.holdings = holdings;
    }

    @GetMapping("/staff")
    String people(AsKnownAt asKnownAt, Model model) {
        model.addAttribute("people", people.all(asKnownAt));
        model.addAttribute("holder", holdings.find(asKnownAt).map(DeskHolding::holder).orElse(null));
        return "staff/people";
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry peopleMenuEntry() {
            return MenuEntry.page(140, "People and Keys", "/staff");
        }
    }
}
