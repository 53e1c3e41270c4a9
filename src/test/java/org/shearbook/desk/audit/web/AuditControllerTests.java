package org.shearbook.desk.audit.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.hamcrest.Matchers.allOf;
import static org.hamcrest.Matchers.containsString;
import static org.hamcrest.Matchers.everyItem;
import static org.hamcrest.Matchers.is;
import static org.hamcrest.Matchers.not;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.user;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.delete;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.content;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.jsonPath;
import static org.springframework.test.web.servlet.result.MockMvcResultMatchers.status;

import java.util.Set;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.shearbook.desk.audit.Actor;
import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.audit.AuditEntry;
import org.shearbook.desk.audit.AuditTrail;
import org.shearbook.desk.staff.PersonBook;
import org.shearbook.desk.staff.Role;
import org.shearbook.testing.OnH2;
import org.shearbook.testing.OnPostgres;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.security.core.authority.SimpleGrantedAuthority;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.RequestPostProcessor;

/** Who reads which entries, and how they are found; on both databases, since the search is theirs. */
class AuditControllerTests {

    @Nested
    @OnH2
    class H2Tests extends Suite {
    }

    @Nested
    @OnPostgres
    class PostgresTests extends Suite {
    }

    abstract static class Suite {

        private static final RequestPostProcessor SUPERVISOR = user("aud-s").roles("SUPERVISOR");
        private static final RequestPostProcessor FORECASTER = user("aud-b").roles("FORECASTER");
        private static final RequestPostProcessor KEY = SecurityMockMvcRequestPostProcessors.user("key:feed").authorities(new SimpleGrantedAuthority("SCOPE_read"));

        @Autowired MockMvc mvc;
        @Autowired PersonBook people;
        @Autowired AuditTrail audit;
        @Autowired JdbcTemplate jdbc;

        @BeforeEach
        void actsOfTwoPeople() {
            if (people.find("aud-one", AsKnownAt.now()).isEmpty()) {
                people.keep(Actor.named("aud-t", "ADMINISTRATOR", false, "WS-1"), "aud-one", "One of a kind", Set.of(Role.OBSERVER), "p");
                people.keep(Actor.named("aud-b", "FORECASTER", false, "WS-2"), "aud-two", "Two of a kind", Set.of(Role.OBSERVER), "p");
                people.keep(Actor.named("aud-t", "ADMINISTRATOR", false, "WS-1"), "aud-three", "Third", Set.of(Role.OBSERVER), "p");
            }
        }

        @Test
        void aSupervisorSeesAllAndFindsOneThing() throws Exception {
            mvc.perform(get("/audit").param("kind", "person").param("id", "aud-one").with(SUPERVISOR)).andExpect(status().isOk())
                    .andExpect(content().string(allOf(containsString("One of a kind"), not(containsString("Two of a kind")), containsString("Check the chain"),
                            containsString(audit.head().hash()), containsString("events checked, chain intact"))));
            mvc.perform(get("/audit").param("actor", "aud-b").with(SUPERVISOR))
                    .andExpect(content().string(allOf(containsString("Two of a kind"), not(containsString("One of a kind")))));
        }

        @Test
        void othersSeeWhatTheyDidThemselvesWhateverTheyAsk() throws Exception {
            mvc.perform(get("/audit").param("actor", "aud-t").with(FORECASTER)).andExpect(status().isOk())
                    .andExpect(content().string(allOf(containsString("Two of a kind"), not(containsString("One of a kind")))));
            mvc.perform(get("/api/v1/audit-entries").param("actor", "aud-t").with(FORECASTER)).andExpect(status().isOk())
                    .andExpect(jsonPath("$.entries[*].actor", everyItem(is("aud-b"))));
            mvc.perform(get("/api/v1/audit-entries").with(KEY)).andExpect(status().isOk()).andExpect(jsonPath("$.entries").isEmpty());
        }

        @Test
        void theCheckOfTheChainIsForSupervisorsAndAdministrators() throws Exception {
            mvc.perform(get("/audit/integrity").with(SUPERVISOR)).andExpect(status().isOk()).andExpect(content().string(containsString("The chain is intact.")));
            mvc.perform(get("/audit/integrity").with(FORECASTER)).andExpect(status().isForbidden());
            mvc.perform(get("/api/v1/audit-entries/integrity").with(user("aud-t").roles("ADMINISTRATOR"))).andExpect(status().isOk())
                    .andExpect(jsonPath("$.intact").value(true)).andExpect(jsonPath("$.headHash").value(audit.head().hash()))
                    .andExpect(jsonPath("$.firstBroken").isEmpty());
            mvc.perform(get("/api/v1/audit-entries/integrity").with(FORECASTER)).andExpect(status().isForbidden()).andExpect(jsonPath("$.code").value("NOT_ALLOWED"));
        }

        @Test
        void entriesComeNewestFirstAndPageBackWithoutGap() throws Exception {
            long newest = audit.head().entries();
            mvc.perform(get("/api/v1/audit-entries").param("limit", "2").with(SUPERVISOR)).andExpect(status().isOk())
                    .andExpect(jsonPath("$.entries[0].sequence").value(newest)).andExpect(jsonPath("$.entries[1].sequence").value(newest - 1))
                    .andExpect(jsonPath("$.next").value(newest - 1));
            mvc.perform(get("/api/v1/audit-entries").param("limit", "1").param("after", Long.toString(newest - 1)).with(SUPERVISOR))
                    .andExpect(jsonPath("$.entries[0].sequence").value(newest - 2));
        }

        @Test
        void entriesAreFoundByTheTimeTheyWereRecorded() throws Exception {
            AuditEntry one = audit.ofSubject("person", "aud-one", AsKnownAt.now()).get(0);
            mvc.perform(get("/api/v1/audit-entries").param("from", one.recordedAt().toString()).param("until", one.recordedAt().toString()).with(SUPERVISOR))
                    .andExpect(jsonPath("$.entries[*].sequence", is(java.util.List.of((int) one.sequence()))));
            mvc.perform(get("/audit").param("from", "yesterday").with(SUPERVISOR)).andExpect(status().isOk())
                    .andExpect(content().string(allOf(containsString("href=\"#from\""), containsString("The start is not a moment"))));
        }

        @Test
        void everyReadingIsKeptInTheChainOfAccesses() throws Exception {
            mvc.perform(get("/audit").with(SUPERVISOR)).andExpect(status().isOk());
            assertThat(jdbc.queryForObject("select count(*) from access_entry where actor = 'aud-s' and act = 'audit read'", Long.class)).isPositive();
        }

        @Test
        void noAddressChangesTheChain() throws Exception {
            mvc.perform(delete("/api/v1/audit-entries/1").with(SUPERVISOR).with(SecurityMockMvcRequestPostProcessors.csrf())).andExpect(status().is4xxClientError());
            assertThat(audit.integrity().intact()).isTrue();
        }
    }
}
