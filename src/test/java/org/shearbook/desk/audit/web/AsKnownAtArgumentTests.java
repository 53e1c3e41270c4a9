package org.shearbook.desk.audit.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.springframework.web.ErrorResponseException;

class AsKnownAtArgumentTests {

    @Test
    void aBlankOrAbsentMomentIsNow() {
        assertThat(AsKnownAtArgument.read(null).isNow()).isTrue();
        assertThat(AsKnownAtArgument.read("  ").isNow()).isTrue();
    }

    @Test
    void aMomentIsReadWithAndWithoutSeconds() {
        assertThat(AsKnownAtArgument.read("2031-03-12T06:15Z").moment()).isEqualTo(Instant.parse("2031-03-12T06:15:00Z"));
        assertThat(AsKnownAtArgument.read("2031-03-12T04:15:07-02:00").moment()).isEqualTo(Instant.parse("2031-03-12T06:15:07Z"));
    }

    @Test
    void anythingElseIsRefusedWithWhatToDo() {
        assertThatThrownBy(() -> AsKnownAtArgument.read("yesterday")).isInstanceOfSatisfying(ErrorResponseException.class, refused -> {
            assertThat(refused.getStatusCode().value()).isEqualTo(400);
            assertThat(refused.getBody().getProperties()).containsEntry("code", "AS_KNOWN_AT_UNREADABLE").containsEntry("field", "asKnownAt");
        });
    }
}
