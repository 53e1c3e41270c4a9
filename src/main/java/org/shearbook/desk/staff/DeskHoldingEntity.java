package org.shearbook.desk.staff;

import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

@Entity
@Table(name = "desk_holding")
class DeskHoldingEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "desk_holding_seq")
    @SequenceGenerator(name = "desk_holding_seq", sequenceName = "desk_holding_seq", allocationSize = 50)
    Long rowId;
    int version;
    @Nullable String holder;
    @Nullable String reason;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected DeskHoldingEntity() {
    }

    DeskHoldingEntity(int version, @Nullable String holder, @Nullable String reason, Instant recordedAt) {
        this.version = version;
        this.holder = holder;
        this.reason = reason;
        this.observedAt = recordedAt;
        this.receivedAt = recordedAt;
        this.recordedAt = recordedAt;
    }

    DeskHolding toHolding() {
        return new DeskHolding(version, holder, recordedAt, reason);
    }
}
