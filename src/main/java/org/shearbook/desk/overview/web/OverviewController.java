package org.shearbook.desk.overview.web;

import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.forecast.ForecastBook;
import org.shearbook.desk.overview.Desk;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.staff.DeskHolding;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.Person;
import org.shearbook.desk.staff.PersonBook;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The Desk, the page everybody starts from. */
@Controller
class OverviewController {

    private final Desk desk;
    private final DeskHoldingBook holdings;
    private final PersonBook people;
    private final AuditTrail audit;
    private final CurrentActor current;

    OverviewController(Desk desk, DeskHoldingBook holdings, PersonBook people, AuditTrail audit, CurrentActor current) {
        this.desk = desk;
        this.holdings = holdings;
        this.people = people;
        this.audit = audit;
        this.current = current;
    }

    @GetMapping("/")
    String desk(AsKnownAt asKnownAt, Model model) {
        Actor actor = current.get();
        DeskHolding holding = holdings.find(asKnownAt).orElse(null);
        boolean vacant = holding == null || holding.isVacant();
        Desk.Situation situation = desk.situation(asKnownAt);
        model.addAttribute("desk", situation);
        model.addAttribute("now", situation.at());
        model.addAttribute("isNow", asKnownAt.isNow());
        model.addAttribute("vacant", vacant);
        model.addAttribute("since", holding == null ? null : holding.since());
        model.addAttribute("holderName", vacant ? null : people.find(holding.holder(), asKnownAt).map(Person::displayName).orElse(holding.holder()));
        model.addAttribute("holder", !vacant && actor.username().equals(holding.holder()) && asKnownAt.isNow());
        model.addAttribute("mayDraft", ForecastBook.mayDraft(actor));
        model.addAttribute("head", audit.head());
        return "overview/desk";
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry deskMenuEntry() {
            return MenuEntry.page(10, "The Desk", "/");
        }
    }
}
