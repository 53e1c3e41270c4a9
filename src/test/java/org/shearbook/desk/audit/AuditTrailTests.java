package org.shearbook.desk.audit;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** The chain finds every single change to a copy of it. */
class AuditTrailTests {

    private record Done(Actor actor, String act, Subject subject, @Nullable String before, @Nullable String after, @Nullable String reason)
            implements Audited {
    }

    private static List<AuditEntry> chain(int length) {
        List<AuditEntry> entries = new ArrayList<>();
        String previous = ChainHash.START;
        for (int i = 1; i <= length; i++) {
            Done act = new Done(Actor.named("forecaster-b", "FORECASTER", true, "WS-1"), "issued",
                    new Audited.Subject("forecast", "4", i), i == 1 ? null : "FL260", "FL2" + i + "0", i % 3 == 0 ? "sharper" : null);
            AuditEntry entry = AuditEntry.following(i, previous, Instant.parse("2031-03-12T07:40:00Z").plusSeconds(i), act, "0.1.0");
            entries.add(entry);
            previous = entry.hash();
        }
        return entries;
    }

    @Test
    void aWholeChainIsIntact() {
        AuditTrail.Integrity found = AuditTrail.walk(chain(50).iterator());
        assertThat(found.intact()).isTrue();
        assertThat(found.entries()).isEqualTo(50);
    }

    @Test
    void everySingleChangedFieldIsFoundAtItsEntry() {
        List<AuditEntry> whole = chain(12);
        for (int i = 0; i < whole.size(); i++) {
            AuditEntry e = whole.get(i);
            Actor a = e.actor();
            List<AuditEntry> changed = List.of(
                    new AuditEntry(e.sequence(), e.recordedAt().plusNanos(1000), a, e.act(), e.subject(), e.before(), e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), new Actor("forecaster-c", a.role(), a.holdsDesk(), a.workstation(), a.address(), a.session()), e.act(), e.subject(), e.before(), e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), new Actor(a.username(), a.role(), false, a.workstation(), a.address(), a.session()), e.act(), e.subject(), e.before(), e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, "cancelled", e.subject(), e.before(), e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, e.act(), new Audited.Subject("forecast", "5", e.subject().version()), e.before(), e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, e.act(), e.subject(), "", e.after(), e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, e.act(), e.subject(), e.before(), null, e.reason(), e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, e.act(), e.subject(), e.before(), e.after(), "n/a", e.applicationVersion(), e.previousHash(), e.hash()),
                    new AuditEntry(e.sequence(), e.recordedAt(), a, e.act(), e.subject(), e.before(), e.after(), e.reason(), "0.1.1", e.previousHash(), e.hash()));
            for (AuditEntry forged : changed) {
                List<AuditEntry> copy = new ArrayList<>(whole);
                copy.set(i, forged);
                assertThat(AuditTrail.walk(copy.iterator()).firstBroken()).as("entry %d as %s", i + 1, forged).isEqualTo(i + 1L);
            }
        }
    }

    @Test
    void anEntryForgedWithItsOwnHashBreaksTheNext() {
        List<AuditEntry> copy = chain(5);
        AuditEntry third = copy.get(2);
        copy.set(2, AuditEntry.following(3, third.previousHash(), third.recordedAt(),
                new Done(third.actor(), "cancelled", third.subject(), null, null, null), "0.1.0"));
        assertThat(AuditTrail.walk(copy.iterator()).firstBroken()).isEqualTo(4L);
    }

    @Test
    void everyDeletionInsertionAndExchangeIsFound() {
        List<AuditEntry> whole = chain(8);
        for (int i = 0; i < whole.size() - 1; i++) {
            List<AuditEntry> without = new ArrayList<>(whole);
            without.remove(i);
            assertThat(AuditTrail.walk(without.iterator()).firstBroken()).as("entry %d deleted", i + 1).isEqualTo(i + 1L);
            List<AuditEntry> twice = new ArrayList<>(whole);
            twice.add(i, whole.get(i));
            assertThat(AuditTrail.walk(twice.iterator()).intact()).as("entry %d twice", i + 1).isFalse();
            List<AuditEntry> exchanged = new ArrayList<>(whole);
            Collections.swap(exchanged, i, i + 1);
            assertThat(AuditTrail.walk(exchanged.iterator()).firstBroken()).as("entries %d and %d exchanged", i + 1, i + 2).isEqualTo(i + 1L);
        }
    }

    @Test
    void anEmptyTextAndAMissingOneAreTwoContents() {
        String empty = new ChainHash(ChainHash.START).field("before", "").hex();
        String missing = new ChainHash(ChainHash.START).field("before", null).hex();
        assertThat(empty).isNotEqualTo(missing);
    }
}
