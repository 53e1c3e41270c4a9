package org.shearbook.desk.forecast;

/**
 * One thing that keeps a forecast from being filed.
 *
 * @param field  the field to look at
 * @param code   stable name
 * @param reason what is the matter
 * @param remedy what to do
 */
public record Refusal(String field, String code, String reason, String remedy) {

    public String text() {
        return reason + " " + remedy;
    }
}
