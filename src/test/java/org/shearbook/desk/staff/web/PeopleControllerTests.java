package org.shearbook.desk.staff.web;

import static org.hamcrest.Matchers.allOf;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.not;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.redirectedUrl;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.util.Set;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.OnH2;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.MockMvc;

/** Who works here, as it is shown. */
@OnH2
class PeopleControllerTests {

    @Autowired MockMvc mvc;
    @Autowired PersonBook people;

    @Test
    void theListShowsNamesAndRolesAndNoPassword() throws Exception {
        people.keep(Actor.named("administrator-t", "ADMINISTRATOR", false, "WS-1"), "listed-s", "Listed S", Set.of(Role.SUPERVISOR, Role.FORECASTER), "a passphrase of its own");
        mvc.perform(get("/staff").with(user("somebody").roles("OBSERVER"))).andExpect(status().isOk())
                .andExpect(content().string(allOf(containsString("listed-s"), containsString("Listed S"), containsString("supervisor"), not(containsString("bcrypt")))));
        mvc.perform(get("/staff")).andExpect(redirectedUrl("/login"));
    }
}
