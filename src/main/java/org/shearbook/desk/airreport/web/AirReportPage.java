package org.shearbook.desk.airreport.web;

import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.airreport.AirReport;
import org.shearbook.met.decode.DecodedAirReport.Intensity;
import org.shearbook.met.decode.DecodedAirReport.TurbulenceLayer;

/**
 * One report as the pages show it.
 *
 * @param symbol name of its mark; null when the report has no intensity
 * @param word   its intensity in words
 */
record AirReportPage(AirReport report, @Nullable String symbol, String word) {

    static AirReportPage of(AirReport report) {
        return new AirReportPage(report, symbol(report.worstIntensity()), word(report.worstIntensity()));
    }

    public @Nullable Double latitude() {
        return report.place().isResolved() ? report.place().latitude() : null;
    }

    public @Nullable Double longitude() {
        return report.place().isResolved() ? report.place().longitude() : null;
    }

    public String cloud() {
        return switch (report.cloud()) {
            case CLEAR -> "clear";
            case IN_CLOUD -> "in cloud";
            case UNKNOWN -> "–";
        };
    }

    public String weightClass() {
        return switch (report.weightClass()) {
            case "L" -> "light";
            case "M" -> "medium";
            case "H" -> "heavy";
            default -> "–";
        };
    }

    public List<String> layers() {
        return report.turbulence().stream().map(AirReportPage::inWords).toList();
    }

    static @Nullable String symbol(@Nullable Intensity intensity) {
        return intensity == null ? null : switch (intensity) {
            case NIL -> "nil";
            case LGT -> "light";
            case MOD -> "moderate";
            case SEV -> "severe";
            case EXTRM -> "extreme";
        };
    }

    private static String word(@Nullable Intensity intensity) {
        return intensity == null ? "not given" : String.valueOf(symbol(intensity));
    }

    static String inWords(TurbulenceLayer layer) {
        StringBuilder words = new StringBuilder();
        if (layer.frequency() != null) {
            words.append(switch (layer.frequency()) {
                case OCNL -> "occasional ";
                case INTMT -> "intermittent ";
                case CONT -> "continuous ";
            });
        }
        words.append(layer.intensity() == null ? "turbulence of no stated strength" : word(layer.intensity()));
        if (layer.intensityTo() != null && layer.intensityTo() != layer.intensity()) {
            words.append(" to ").append(word(layer.intensityTo()));
        }
        if (!layer.type().isEmpty()) {
            words.append(" (").append(layer.type()).append(')');
        }
        if (!Double.isNaN(layer.baseFeet()) || !Double.isNaN(layer.topFeet())) {
            words.append(Double.isNaN(layer.baseFeet()) ? " below " + feet(layer.topFeet())
                    : Double.isNaN(layer.topFeet()) ? " above " + feet(layer.baseFeet())
                    : layer.baseFeet() == layer.topFeet() ? " at " + feet(layer.baseFeet())
                    : " from " + feet(layer.baseFeet()) + " to " + feet(layer.topFeet()));
        }
        return words.toString();
    }

    private static String feet(double feet) {
        return String.format(Locale.ROOT, "%,.0f ft", feet).replace(',', '\u2009');
    }
}
