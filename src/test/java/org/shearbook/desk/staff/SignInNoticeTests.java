package org.shearbook.desk.staff;

import static org.assertj.core.api.Assertions.assertThat;
import static org.mockito.ArgumentMatchers.any;
import static org.mockito.Mockito.mock;
import static org.mockito.Mockito.when;

import java.time.Instant;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.ExtendWith;
import org.springframework.boot.test.system.CapturedOutput;
import org.springframework.boot.test.system.OutputCaptureExtension;

/** A desk without people says so at its start. */
@ExtendWith(OutputCaptureExtension.class)
class SignInNoticeTests {

    private final PersonBook people = mock(PersonBook.class);

    @Test
    void aDeskWithoutPeopleSaysThatNobodyCanSignInYet(CapturedOutput output) {
        when(people.all(any())).thenReturn(List.of());
        new SignInNotice(people).say();
        assertThat(output).contains("Nobody can sign in yet");
    }

    @Test
    void aDeskWithPeopleSaysNothing(CapturedOutput output) {
        when(people.all(any())).thenReturn(List.of(new Person("a", 1, "A", Set.of(Role.OBSERVER), true, Instant.EPOCH)));
        new SignInNotice(people).say();
        assertThat(output).doesNotContain("Nobody can sign in yet");
    }
}
