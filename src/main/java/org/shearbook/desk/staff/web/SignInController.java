package org.shearbook.desk.staff.web;

import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;

@Controller
class SignInController {

    @GetMapping("/login")
    String signIn() {
        return "staff/sign-in";
    }
}
