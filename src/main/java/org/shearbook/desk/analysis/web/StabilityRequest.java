package org.shearbook.desk.analysis.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.shearbook.desk.shell.Problem;
import org.shearbook.met.taylorgoldstein.Boundary;
import org.springframework.http.HttpStatus;
import org.springframework.web.ErrorResponseException;
import tools.jackson.core.JacksonException;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/**
 * A profile as a script sends it to have its growing waves found. Read by hand, so that a refusal names field and element.
 *
 * @param smoothing full width at half maximum [m]; 0 for none
 */
record StabilityRequest(
        double[] height, double[] eastward, double[] northward, double[] buoyancyFrequencySquared, double[] azimuths, double[] wavenumbers, double smoothing,
        Boundary lower, Boundary upper) {

    static final int MOST_BYTES = 4_000_000;
    static final int MOST_LEVELS = 20_000;
    private static final int MOST_DIRECTIONS = 20_000;

    private static final JsonMapper JSON = JsonMapper.shared();
    private static final Set<String> FIELDS = Set.of("heightM", "eastwardMs", "northwardMs", "n2PerS2", "azimuthsDeg", "wavenumbersPerM", "smoothingM", "lower", "upper");

    /** @throws ErrorResponseException with the problem */
    static StabilityRequest read(byte[] body) {
        if (body.length > MOST_BYTES) {
            throw refused(HttpStatus.CONTENT_TOO_LARGE, "TOO_LARGE", "A profile may have %d bytes; this has more. Send fewer levels.".formatted(MOST_BYTES), Map.of());
        }
        JsonNode json = json(body);
        for (String name : json.propertyNames()) {
            if (!FIELDS.contains(name)) {
                throw refused("UNKNOWN_FIELD", "\"%s\" is not a field of this call; the fields are %s.".formatted(cut(name), FIELDS.stream().sorted().toList()), name, null);
            }
        }
        double[] height = required(json, "heightM", 1e6);
        double[] eastward = required(json, "eastwardMs", 1e5);
        double[] northward = required(json, "northwardMs", 1e5);
        double[] stability = required(json, "n2PerS2", 1e6);
        int n = height.length;
        requireLength("eastwardMs", eastward, n);
        requireLength("northwardMs", northward, n);
        requireLength("n2PerS2", stability, n);
        if (n < 2) {
            throw refused("TOO_FEW_LEVELS", "There are %d levels; a shear needs at least two.".formatted(n), "heightM", null);
        }
        for (int i = 1; i < n; i++) {
            if (!(height[i] > height[i - 1])) {
                throw refused("HEIGHTS_NOT_ASCENDING", "heightM[%d] = %s does not lie above heightM[%d] = %s. Sort the levels and leave out doubles."
                        .formatted(i, height[i], i - 1, height[i - 1]), "heightM", i);
            }
        }
        double[] azimuths = optional(json, "azimuthsDeg", 1e6);
        double[] wavenumbers = optional(json, "wavenumbersPerM", 1e6);
        for (int i = 0; i < wavenumbers.length; i++) {
            if (!(wavenumbers[i] > 0)) {
                throw refused("OUT_OF_RANGE", "wavenumbersPerM[%d] = %s must be positive: radians per metre.".formatted(i, wavenumbers[i]), "wavenumbersPerM", i);
            }
        }
        return new StabilityRequest(height, eastward, northward, stability, azimuths, wavenumbers, smoothing(json, height[n - 1] - height[0]),
                boundary(json, "lower"), boundary(json, "upper"));
    }

    private static JsonNode json(byte[] body) {
        if (body.length == 0) {
            throw refused(HttpStatus.BAD_REQUEST, "EMPTY_INPUT", "There is nothing in this. Send a JSON object with heightM, eastwardMs, northwardMs, n2PerS2, lower and upper.", Map.of());
        }
        try {
            JsonNode json = JSON.readTree(body);
            if (json.isObject()) {
                return json;
            }
        } catch (JacksonException unreadable) {
            var place = unreadable.getLocation();
            throw refused(HttpStatus.BAD_REQUEST, "NOT_JSON", "This can't be read as JSON%s. Numbers are plain: NaN and Infinity are not JSON; leave such levels out."
                    .formatted(place == null ? "" : " at line %d, column %d".formatted(place.getLineNr(), place.getColumnNr())),
                    place == null ? Map.of() : Map.of("line", place.getLineNr(), "column", place.getColumnNr()));
        }
        throw refused(HttpStatus.BAD_REQUEST, "NOT_AN_OBJECT", "A JSON object is expected: {\"heightM\": […], …}.", Map.of());
    }

    private static double[] required(JsonNode json, String field, double greatest) {
        if (!json.hasNonNull(field)) {
            throw refused("FIELD_MISSING", "%s is missing. heightM, eastwardMs, northwardMs and n2PerS2 are lists of one length.".formatted(field), field, null);
        }
        return numbers(json.get(field), field, MOST_LEVELS, greatest);
    }

    private static double[] optional(JsonNode json, String field, double greatest) {
        return json.hasNonNull(field) ? numbers(json.get(field), field, MOST_DIRECTIONS, greatest) : new double[0];
    }

    private static double[] numbers(JsonNode list, String field, int most, double greatest) {
        if (!list.isArray()) {
            throw refused("NOT_A_LIST", "%s must be a list of numbers.".formatted(field), field, null);
        }
        if (list.size() > most) {
            throw refused("TOO_MANY", "%s has %d elements; at most %d are taken.".formatted(field, list.size(), most), field, null);
        }
        List<Double> values = new ArrayList<>(list.size());
        for (JsonNode element : list) {
            double value = element.isNumber() ? element.asDouble() : Double.NaN;
            if (!Double.isFinite(value)) {
                throw refused("NOT_A_NUMBER", "%s[%d] is %s, not a finite number. Leave out levels where something is missing.".formatted(field, values.size(),
                        cut(element.toString())), field, values.size());
            }
            if (Math.abs(value) > greatest) {
                throw refused("OUT_OF_RANGE", "%s[%d] = %s lies beyond ±%.0e; check the unit.".formatted(field, values.size(), value, greatest), field, values.size());
            }
            values.add(value);
        }
        return values.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private static double smoothing(JsonNode json, double depth) {
        if (!json.hasNonNull("smoothingM")) {
            return 0;
        }
        JsonNode node = json.get("smoothingM");
        double value = node.isNumber() ? node.asDouble() : Double.NaN;
        if (!(value >= 0 && value <= depth)) {
            throw refused("OUT_OF_RANGE", "smoothingM must be a number from 0 to the depth of the profile, %s m: the full width at half maximum.".formatted(depth), "smoothingM", null);
        }
        return value;
    }

    private static Boundary boundary(JsonNode json, String field) {
        String said = json.hasNonNull(field) ? json.get(field).asString("") : "";
        return switch (said) {
            case "rigid" -> Boundary.RIGID;
            case "radiating" -> Boundary.RADIATING;
            default -> throw refused("BOUNDARY_UNKNOWN", "%s must be \"rigid\" (no vertical motion there) or \"radiating\" (uniform air goes on).".formatted(field), field, null);
        };
    }

    private static void requireLength(String field, double[] values, int n) {
        if (values.length != n) {
            throw refused("LENGTHS_DIFFER", "%s has %d elements and heightM has %d.".formatted(field, values.length, n), field, null);
        }
    }

    private static String cut(String text) {
        return text.length() > 40 ? text.substring(0, 40) + "…" : text;
    }

    private static ErrorResponseException refused(String code, String text, String field, @Nullable Integer index) {
        return refused(HttpStatus.UNPROCESSABLE_CONTENT, code, text, index == null ? Map.of("field", cut(field)) : Map.of("field", cut(field), "index", index));
    }

    static ErrorResponseException refused(HttpStatus status, String code, String text, Map<String, Object> more) {
        return new ErrorResponseException(status, Problem.of(status, code, text, more), null);
    }
}
