package org.shearbook.desk.station;

import jakarta.persistence.Entity;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;

@Entity
@Table(name = "fix_list_version")
class FixListEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "fix_list_version_seq")
    @SequenceGenerator(name = "fix_list_version_seq", sequenceName = "fix_list_version_seq", allocationSize = 50)
    Long rowId;
    String listName;
    int version;
    int fixCount;
    Instant observedAt;
    Instant receivedAt;
    Instant recordedAt;

    protected FixListEntity() {
    }

    FixListEntity(String listName, int version, int fixCount, Instant receivedAt, Instant recordedAt) {
        this.listName = listName;
        this.version = version;
        this.fixCount = fixCount;
        this.observedAt = receivedAt;
        this.receivedAt = receivedAt;
        this.recordedAt = recordedAt;
    }

    FixList toList() {
        return new FixList(listName, version, fixCount, recordedAt);
    }
}
