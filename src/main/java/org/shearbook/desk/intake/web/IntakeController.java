package org.shearbook.desk.intake.web;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.intake.Arrival;
import org.shearbook.desk.intake.Channel;
import org.shearbook.desk.intake.IntakeDoor;
import org.shearbook.desk.intake.IntakeQueue;
import org.shearbook.desk.intake.ItemState;
import org.shearbook.desk.intake.QueueItem;
import org.shearbook.desk.intake.SettlementRefused;
import org.shearbook.desk.intake.TakenIn;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.desk.staff.CurrentActor;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The page Intake: upload, paste, what became of it, and the queue. */
@Controller
class IntakeController {

    private static final int ITEMS_SHOWN = 200;
    private static final int BATCHES_SHOWN = 20;

    private final IntakeDoor door;
    private final IntakeQueue queue;
    private final CurrentActor actor;

    IntakeController(IntakeDoor door, IntakeQueue queue, CurrentActor actor) {
        this.door = door;
        this.queue = queue;
        this.actor = actor;
    }

    @GetMapping("/intake")
    String page(AsKnownAt asKnownAt, Model model) {
        model.addAttribute("items", queue.open(asKnownAt, ITEMS_SHOWN));
        model.addAttribute("openCount", queue.openCount(asKnownAt));
        model.addAttribute("batches", queue.batches(asKnownAt, Long.MAX_VALUE, BATCHES_SHOWN));
        model.addAttribute("asKnownAt", asKnownAt.isNow() ? null : asKnownAt.moment());
        return "intake/intake";
    }

    /** Files and pasted text in one form; either may be empty. */
    @PostMapping("/intake/messages")
    String takeIn(@RequestParam(name = "file", required = false) List<MultipartFile> files, @RequestParam(defaultValue = "") String pasted, RedirectAttributes said)
            throws IOException {
        List<Arrival> arrivals = new ArrayList<>();
        if (files != null) {
            for (MultipartFile file : files) {
                // A form without a chosen file still sends one, without a name and empty.
                if (file.getOriginalFilename() != null && !file.getOriginalFilename().isEmpty()) {
                    arrivals.add(new Arrival(file.getOriginalFilename(), file.getBytes()));
                }
            }
        }
        if (!pasted.isBlank()) {
            arrivals.add(new Arrival("pasted", pasted.getBytes(StandardCharsets.UTF_8)));
        }
        if (arrivals.isEmpty()) {
            said.addFlashAttribute("refused", "Choose a file or paste a message first.");
            said.addFlashAttribute("refusedField", "file");
            return "redirect:/intake";
        }
        boolean onlyPasted = arrivals.size() == 1 && !pasted.isBlank();
        TakenIn taken = door.takeIn(actor.get(), arrivals, onlyPasted ? Channel.PASTE : Channel.UPLOAD);
        said.addFlashAttribute("justTakenIn", true);
        return "redirect:/intake/batches/" + taken.batchId();
    }

    @GetMapping("/intake/batches/{id}")
    String batch(@PathVariable long id, Model model) {
        model.addAttribute("whole", queue.batch(id).orElseThrow(() -> new ResponseStatusException(HttpStatus.NOT_FOUND)));
        return "intake/batch";
    }

    @GetMapping("/intake/items/{id}")
    String item(@PathVariable long id, AsKnownAt asKnownAt, Model model) {
        model.addAttribute("item", found(id, asKnownAt));
        return "intake/item";
    }

    @PostMapping("/intake/items/{id}/settlements")
    String setAside(@PathVariable long id, @RequestParam(defaultValue = "") String reason, RedirectAttributes said) {
        try {
            queue.settle(actor.get(), id, ItemState.SET_ASIDE, reason);
            said.addFlashAttribute("done", "Item " + id + " is set aside. It stays in the record.");
            return "redirect:/intake";
        } catch (SettlementRefused refused) {
            said.addFlashAttribute("refused", refused.getMessage());
            said.addFlashAttribute("refusedField", refused.field().isEmpty() ? "reason" : refused.field());
            return "redirect:/intake/items/" + id;
        }
    }

    /** The corrected text comes in like anything else; the item is settled only when something in it was accepted. */
    @PostMapping("/intake/items/{id}/corrections")
    String correct(@PathVariable long id, @RequestParam(defaultValue = "") String corrected, RedirectAttributes said) {
        QueueItem item = found(id, AsKnownAt.now());
        if (corrected.isBlank() || item.state() != ItemState.OPEN) {
            said.addFlashAttribute("refused", corrected.isBlank() ? "The corrected text is empty. To leave the item unread, set it aside." : "The item was settled already.");
            said.addFlashAttribute("refusedField", "corrected");
            return "redirect:/intake/items/" + id;
        }
        TakenIn taken = door.takeIn(actor.get(), List.of(new Arrival("correction of item " + id, corrected.getBytes(StandardCharsets.UTF_8))), Channel.PASTE);
        if (!taken.accepted().isEmpty()) {
            queue.settle(actor.get(), id, ItemState.CORRECTED, "corrected and taken in as batch " + taken.batchId());
        }
        return "redirect:/intake/batches/" + taken.batchId();
    }

    private QueueItem found(long id, AsKnownAt asKnownAt) {
        return queue.find(id, asKnownAt).orElseThrow(() -> new ResponseStatusException(HttpStatus.NOT_FOUND));
    }

    @Configuration(proxyBeanMethods = false)
    static class Menu {

        @Bean
        MenuEntry intakeMenuEntry() {
            return MenuEntry.page(80, "Intake", "/intake");
        }
    }
}
