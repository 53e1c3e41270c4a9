package org.shearbook.desk.sounding;

import java.io.ByteArrayOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.TreeSet;
import org.shearbook.met.decode.DecodedSounding;
import org.shearbook.met.decode.ReportedLevel;

/** SHA-256 over what a sounding says, however it was written: to tell a correction from the same thing sent again. */
final class ContentDigest {

    private ContentDigest() {
    }

    /** Over levels, parts and correction mark. */
    static String ofLevels(DecodedSounding sounding) {
        return digest(sounding, false);
    }

    /** Over times, place and instrument too. */
    static String ofAll(DecodedSounding sounding) {
        return digest(sounding, true);
    }

    private static String digest(DecodedSounding sounding, boolean whole) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream(sounding.levels().size() * 80 + 100);
        try (DataOutputStream out = new DataOutputStream(bytes)) {
            out.writeUTF(String.join(",", new TreeSet<>(sounding.parts())));
            out.writeUTF(sounding.correction());
            if (whole) {
                out.writeUTF(String.valueOf(sounding.nominalAt()));
                out.writeUTF(String.valueOf(sounding.launchedAt()));
                out.writeUTF(sounding.sondeType());
                for (double value : new double[] {sounding.latitude(), sounding.longitude(), sounding.elevation()}) {
                    out.writeDouble(value);
                }
            }
            for (ReportedLevel level : sounding.levels()) {
                for (double value : new double[] {level.pressure(), level.height(), level.temperature(), level.dewPoint(), level.windFromDirection(),
                    level.windSpeed(), level.elapsed(), level.latitude(), level.longitude()}) {
                    out.writeDouble(value);
                }
                int significance = 0;
                for (ReportedLevel.Significance one : level.significance()) {
                    significance |= 1 << one.ordinal();
                }
                out.writeInt(significance);
            }
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes.toByteArray()));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
