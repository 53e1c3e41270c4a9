package org.shearbook.desk.forecast;

/** What the forecast says of the turbulence, by the words of the report classes. */
public enum Intensity {

    MOD("MOD", "moderate turbulence"),
    MOD_OCNL_SEV("MOD OCNL SEV", "moderate, occasionally severe turbulence"),
    SEV("SEV", "severe turbulence");

    private final String code;
    private final String words;

    Intensity(String code, String words) {
        this.code = code;
        this.words = words;
    }

    /** The standard abbreviations: {@code MOD OCNL SEV}. */
    public String code() {
        return code;
    }

    /** Whether severe turbulence is expected at all. */
    public boolean mentionsSevere() {
        return this != MOD;
    }

    public String words() {
        return words;
    }
}
