package org.shearbook.met.decode;

import java.util.EnumMap;
import java.util.EnumSet;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * A pilot report cut into its groups. A group begins at a slash with its two letters, at the first place where that
 * is plausible; what stands behind the remarks' letters is remark, whatever it looks like.
 */
final class PilotReportGroups {

    /** The groups by their letters. */
    enum Tag { OV, TM, FL, TP, SK, WX, TA, WV, TB, IC, RM }

    private static final Tag[] TAGS = Tag.values();

    private final Map<Tag, StringBuilder> texts = new EnumMap<>(Tag.class);
    private final Set<Tag> filled = EnumSet.noneOf(Tag.class);
    private final Map<Tag, Integer> starts = new EnumMap<>(Tag.class);

    /**
     * @param capitals the input in capitals, without control characters
     * @param from     behind the letters that mark the report
     * @param to       its end
     */
    PilotReportGroups(String capitals, int from, int to) {
        @Nullable Tag open = null;
        boolean openIsBlank = true;
        int openedAt = from;
        int index = from;
        while (index < to) {
            if (capitals.charAt(index) != '/') {
                openIsBlank &= capitals.charAt(index) == ' ';
                index++;
                continue;
            }
            int letters = index + 1;
            while (letters < to && letters < index + 4 && capitals.charAt(letters) == ' ') {
                letters++;
            }
            @Nullable Tag tag = tagAt(capitals, letters, to);
            if (tag == null || !begins(tag, open, openIsBlank, capitals, letters + 2, to)) {
                index++;
                continue;
            }
            close(open, capitals, openedAt, index);
            open = tag;
            openIsBlank = true;
            openedAt = letters + 2;
            index = openedAt;
            if (tag == Tag.RM) {
                break;
            }
        }
        close(open, capitals, openedAt, to);
    }

    private static @Nullable Tag tagAt(String capitals, int at, int to) {
        if (at + 2 > to) {
            return null;
        }
        for (Tag tag : TAGS) {
            if (capitals.startsWith(tag.name(), at)) {
                return tag;
            }
        }
        return null;
    }

    /** Whether this is the tag and not the beginning of a word such as OVC, SKC or TAKEOFF. */
    private boolean begins(Tag tag, @Nullable Tag open, boolean openIsBlank, String capitals, int behind, int to) {
        if (tag == open) {
            return openIsBlank;
        }
        if (filled.contains(tag)) {
            // a second turbulence group says more about the air; the second of anything else is part of the text before it
            return tag == Tag.TB;
        }
        char next = behind < to ? capitals.charAt(behind) : ' ';
        return switch (tag) {
            case OV -> !(next == 'C' && isSkyCover(capitals, behind + 1, to));
            case TA -> !Character.isLetter(next) || next == 'M' || next == 'P' || next == 'O' || next == 'U';
            case FL -> !capitals.startsWith("URR", behind) && !capitals.startsWith("APS", behind);
            case TM -> !Character.isLetter(next) || next == 'O' || next == 'U';
            default -> true;
        };
    }

    private static boolean isSkyCover(String capitals, int at, int to) {
        return at >= to || !Character.isLetter(capitals.charAt(at)) || capitals.startsWith("UNK", at) || capitals.startsWith("TOP", at);
    }

    private void close(@Nullable Tag open, String capitals, int from, int to) {
        if (open == null) {
            return;
        }
        StringBuilder text = texts.get(open);
        if (text == null || !filled.contains(open)) {
            texts.put(open, new StringBuilder(capitals.substring(from, to)));
            starts.put(open, from);
        } else {
            // a full stop: what follows is said anew and is no range with what went before
            text.append(" . ").append(capitals, from, to);
        }
        if (!capitals.substring(from, to).isBlank()) {
            filled.add(open);
        }
    }

    boolean has(Tag tag) {
        return texts.containsKey(tag);
    }

    /** The text of a group without its letters; empty when the report has none. */
    String text(Tag tag) {
        StringBuilder text = texts.get(tag);
        return text == null ? "" : text.toString().strip();
    }

    /** Index of its first character in the input. */
    int start(Tag tag) {
        return starts.getOrDefault(tag, 0);
    }

    int count() {
        return texts.size();
    }
}
