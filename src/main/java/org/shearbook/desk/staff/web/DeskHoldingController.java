package org.shearbook.desk.staff.web;

import org.shearbook.desk.staff.CurrentActor;
import org.shearbook.desk.staff.DeskHoldingBook;
import org.shearbook.desk.staff.DeskNotVacant;
import org.shearbook.desk.staff.MayNotHoldDesk;
import org.shearbook.desk.staff.NotHoldingDesk;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** Taking and leaving the desk: one logged click each. */
@Controller
class DeskHoldingController {

    private final DeskHoldingBook holdings;
    private final CurrentActor actor;

    DeskHoldingController(DeskHoldingBook holdings, CurrentActor actor) {
        this.holdings = holdings;
        this.actor = actor;
    }

    @PostMapping("/staff/desk-holdings")
    String take(RedirectAttributes said) {
        try {
            holdings.take(actor.get());
            said.addFlashAttribute("done", "You hold the desk.");
        } catch (DeskNotVacant | MayNotHoldDesk refused) {
            said.addFlashAttribute("refused", refused.getMessage());
        }
        return "redirect:/";
    }

    @PostMapping("/staff/desk-holdings/ends")
    String leave(RedirectAttributes said) {
        try {
            holdings.leave(actor.get());
            said.addFlashAttribute("done", "You left the desk; it is vacant.");
        } catch (NotHoldingDesk refused) {
            said.addFlashAttribute("refused", refused.getMessage());
        }
        return "redirect:/";
    }
}
