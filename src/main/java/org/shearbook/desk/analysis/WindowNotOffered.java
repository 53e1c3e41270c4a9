package org.shearbook.desk.analysis;

import java.util.stream.Collectors;

/** A window was asked for that the methods do not offer. */
public class WindowNotOffered extends RuntimeException {

    public WindowNotOffered(String asked) {
        super("windowM is %s m; it must be one of %s, a full width at half maximum in metres.".formatted(asked.length() > 20 ? asked.substring(0, 20) : asked,
                AnalysisBook.windows().stream().map(window -> String.valueOf(window.intValue())).collect(Collectors.joining(", "))));
    }
}
