package org.shearbook.desk.analysis.web;

import org.shearbook.desk.analysis.AnalysisBook;
import org.shearbook.desk.shell.MenuEntry;
import org.shearbook.met.decode.EdrClasses;
import org.shearbook.met.profile.SaturationRule;
import org.shearbook.met.richardson.InstrumentNoise;
import org.shearbook.met.taylorgoldstein.SearchSettings;
import org.springframework.context.annotation.Bean;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The page Method and Limits: what the numbers on the other pages are made of, and why one may disagree with them. */
@Controller
class MethodController {

    @GetMapping("/method")
    String page(Model model) {
        model.addAttribute("methodVersion", AnalysisBook.METHOD_VERSION);
        model.addAttribute("defaultWindow", AnalysisBook.defaultWindow());
        model.addAttribute("windows", AnalysisBook.windows().stream().map(window -> String.valueOf(window.intValue())).toList());
        model.addAttribute("smoothing", AnalysisBook.smoothing(AnalysisBook.defaultWindow()));
        model.addAttribute("edrClasses", EdrClasses.known());
        model.addAttribute("noises", InstrumentNoise.known());
        model.addAttribute("saturation", SaturationRule.DEFAULT);
        model.addAttribute("search", SearchSettings.forLayers());
        return "analysis/method";
    }

    @Bean
    static MenuEntry methodMenuEntry() {
        return MenuEntry.page(140, "Method and Limits", "/method");
    }
}
