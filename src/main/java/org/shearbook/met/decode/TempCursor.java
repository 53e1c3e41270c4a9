package org.shearbook.met.decode;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import org.shearbook.met.decode.ReportedLevel.Significance;

/** The groups of one report while it is read: where the reading stands, what it found, what it has to say. */
final class TempCursor {

    private final List<TempGroup> groups;
    private final RemarkList remarks;
    private final List<ReportedLevel> levels = new ArrayList<>();
    private final double speedUnit;
    private int at;

    /** @param speedUnit in which the report gives wind speeds [m s⁻¹] */
    TempCursor(List<TempGroup> groups, int from, double speedUnit, RemarkList remarks) {
        this.groups = groups;
        this.at = from;
        this.speedUnit = speedUnit;
        this.remarks = remarks;
    }

    int at() {
        return at;
    }

    int size() {
        return groups.size();
    }

    boolean hasMore() {
        return at < groups.size();
    }

    void moveTo(int index) {
        at = index;
    }

    /** The group at an index; beyond the last one an empty group that is nothing. */
    TempGroup group(int index) {
        return index < groups.size() ? groups.get(index) : new TempGroup("", 0, 0, 0, 0);
    }

    double speedUnit() {
        return speedUnit;
    }

    List<ReportedLevel> levels() {
        return levels;
    }

    /** Whether the levels end here: another section begins, or the report is over. */
    boolean endsLevels(int index) {
        if (index >= groups.size()) {
            return index == groups.size();
        }
        return isLaterSection(groups.get(index).text());
    }

    static boolean isLaterSection(String group) {
        return group.equals("31313") || group.equals("41414") || group.equals("51515") || group.equals("61616") || group.equals("62626");
    }

    void remark(int index, String code, String text) {
        TempGroup group = groups.get(Math.min(index, groups.size() - 1));
        remarks.add(group.line(), group.column(), code, text);
    }

    /** Says that the groups have slipped at an index. */
    void remarkShift(int index, String consequence) {
        remark(index, "GROUP_SHIFTED", "The groups have slipped at '" + shortened(groups.get(Math.min(index, groups.size() - 1)).text()) + "': "
                + consequence + " Compare with the report as sent; a corrected one replaces this one.");
    }

    void addLevel(double pressure, double height, double temperature, double depression, TempCode.Wind wind, Set<Significance> significance) {
        levels.add(new ReportedLevel(pressure, height, temperature, temperature - depression, wind.fromDirection(), wind.speed(),
                Double.NaN, Double.NaN, Double.NaN, significance.isEmpty() ? EnumSet.noneOf(Significance.class) : significance));
    }

    /** Reads a temperature group and remarks what is wrong in it. */
    double[] temperatureAndDepression(int index) {
        String group = group(index).text();
        if (TempCode.usesUnusedDepression(group)) {
            remark(index, "DEPRESSION_CODE_UNUSED", "The figures 51 to 55 are not used for the dew-point depression; it counts as missing.");
        }
        return new double[] {TempCode.temperature(group), TempCode.depression(group)};
    }

    /** Reads a wind group and remarks what is wrong in it. */
    TempCode.Wind wind(int index) {
        String group = group(index).text();
        TempCode.Wind wind = TempCode.wind(group, speedUnit);
        if (Double.isNaN(wind.fromDirection()) && TempCode.areDigits(group, 0, group.length())) {
            remark(index, "WIND_INVALID", "'" + group + "' is not a wind with a direction of 5° to 360° and a speed up to "
                    + Math.round(TempCode.HIGHEST_SPEED) + " m/s; what is missing in it stays missing.");
        }
        return wind;
    }

    private static String shortened(String text) {
        return text.length() <= 12 ? text : text.substring(0, 12) + "…";
    }
}
