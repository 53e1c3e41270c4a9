package org.shearbook.desk.airreport;

import jakarta.persistence.Entity;
import jakarta.persistence.Id;
import jakarta.persistence.Table;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** What names the aircraft of one version, and the salt of the digest that the version keeps of it. */
@Entity
@Table(name = "air_report_identity")
class AirReportIdentityEntity {

    /** The row of the version it belongs to. */
    @Id
    Long rowId;
    long reportId;
    int version;
    byte[] salt;
    String aircraft;
    String rawText;

    protected AirReportIdentityEntity() {
    }

    AirReportIdentityEntity(AirReportEntity report, byte[] salt, String aircraft, String rawText) {
        rowId = report.rowId;
        reportId = report.reportId;
        version = report.version;
        this.salt = salt;
        this.aircraft = aircraft;
        this.rawText = rawText;
    }

    /** SHA-256 of salt, aircraft and text, in this order; hexadecimal. */
    static String digest(byte[] salt, String aircraft, String rawText) {
        try {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            digest.update(salt);
            digest.update(aircraft.getBytes(StandardCharsets.UTF_8));
            digest.update((byte) 0);
            digest.update(rawText.getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest.digest());
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
