package org.shearbook.desk.demonstration;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.shearbook.desk.staff.Key;
import org.springframework.mock.web.MockFilterChain;
import org.springframework.mock.web.MockHttpServletRequest;
import org.springframework.mock.web.MockHttpServletResponse;

/** The demonstration's accounts and key are for this machine alone. */
class DemonstrationGuardTests {

    @ParameterizedTest
    @ValueSource(strings = {"0.0.0.0", "192.0.2.7", ""})
    void itDoesNotStartOnAnAddressThatOthersReach(String address) {
        assertThatThrownBy(() -> new DemonstrationGuard(address)).isInstanceOf(IllegalStateException.class).hasMessageContaining("loopback");
    }

    @ParameterizedTest
    @ValueSource(strings = {"127.0.0.1", "::1"})
    void itStartsOnLoopback(String address) {
        assertThatCode(() -> new DemonstrationGuard(address)).doesNotThrowAnyException();
    }

    @Test
    void aRequestFromElsewhereIsRefused() throws Exception {
        DemonstrationGuard guard = new DemonstrationGuard("127.0.0.1");
        MockHttpServletRequest request = new MockHttpServletRequest("GET", "/login");
        request.setRemoteAddr("192.0.2.7");
        MockHttpServletResponse response = new MockHttpServletResponse();
        guard.doFilter(request, response, new MockFilterChain());
        assertThat(response.getStatus()).isEqualTo(403);
    }

    @Test
    void theKeyHasItsThreeScopesAndIsForLoopbackOnly() {
        assertThat(new DemonstrationKey().find("ennersund-demo")).contains(new Key("demonstration", Set.of("compute", "read", "messages"), true));
        assertThat(new DemonstrationKey().find("ennersund-dem")).isEmpty();
    }
}
