package org.shearbook.desk.forecast;

/** Where the turbulence lies with respect to cloud. */
public enum Conditions {

    CLEAR_AIR("in clear air"), CLOUD("in cloud"), BOTH("in clear air and in cloud");

    private final String words;

    Conditions(String words) {
        this.words = words;
    }

    public String words() {
        return words;
    }
}
