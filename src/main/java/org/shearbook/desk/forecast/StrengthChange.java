package org.shearbook.desk.forecast;

/** How the layer is expected to change while the forecast holds. */
public enum StrengthChange {

    INTSF("intensifying"), WKN("weakening"), NC("no change in strength");

    private final String words;

    StrengthChange(String words) {
        this.words = words;
    }

    public String words() {
        return words;
    }
}
