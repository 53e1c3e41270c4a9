package org.shearbook.met.decode;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;

/**
 * Received bytes as lines of text that know their number. A line ends at a line feed, and all carriage returns
 * before it belong to the line end: telecommunication lines end with two of them, and reading those as a line end
 * each would put a blank line after every line of a message. Text without any line feed is split at carriage returns.
 */
final class MessageText {

    /**
     * One line.
     *
     * @param number from 1
     * @param start  of the line in the text
     * @param end    of the line in the text, its line end excluded
     */
    record Line(int number, int start, int end) {

        int length() {
            return end - start;
        }
    }

    private final String text;
    private final List<Line> lines;

    private MessageText(String text) {
        this.text = text;
        this.lines = split(text);
    }

    /** Reads one byte as one character, so that nothing is lost and columns are bytes. */
    static MessageText ofBytes(byte[] bytes) {
        return new MessageText(new String(bytes, StandardCharsets.ISO_8859_1));
    }

    /** Reads UTF-8, without its byte-order mark; Latin-1 where the bytes are not UTF-8. */
    static MessageText ofUnicode(byte[] bytes) {
        String text;
        try {
            text = StandardCharsets.UTF_8.newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT).onUnmappableCharacter(CodingErrorAction.REPORT)
                    .decode(ByteBuffer.wrap(bytes)).toString();
        } catch (CharacterCodingException notUnicode) {
            text = new String(bytes, StandardCharsets.ISO_8859_1);
        }
        // In Latin-1 the three bytes of the mark are three characters.
        String mark = text.startsWith("\uFEFF") ? "\uFEFF" : text.startsWith("\u00EF\u00BB\u00BF") ? "\u00EF\u00BB\u00BF" : "";
        return new MessageText(text.substring(mark.length()));
    }

    /**
     * Whether these bytes can't be a text: a zero byte, or more than one control character in twenty among the
     * first 4096.
     */
    static boolean isBinary(byte[] bytes) {
        int looked = Math.min(bytes.length, 4096);
        int controls = 0;
        for (int i = 0; i < looked; i++) {
            int c = bytes[i] & 0xFF;
            if (c == 0) {
                return true;
            }
            if (c < 0x20 && c != '\n' && c != '\r' && c != '\t' || c == 0x7F) {
                controls++;
            }
        }
        // The frame of a bulletin has up to four control characters of its own.
        return controls > 4 && controls * 20 > looked;
    }

    String text() {
        return text;
    }

    List<Line> lines() {
        return lines;
    }

    String text(Line line) {
        return text.substring(line.start(), line.end());
    }

    /** The lines with these indices (the second excluded) as received, line ends between them included. */
    String raw(int from, int until) {
        return from >= until ? "" : text.substring(lines.get(from).start(), lines.get(until - 1).end());
    }

    private static List<Line> split(String text) {
        List<Line> lines = new ArrayList<>();
        char lineEnd = text.indexOf('\n') < 0 ? '\r' : '\n';
        int start = 0;
        for (int i = 0; i <= text.length(); i++) {
            if (i < text.length() && text.charAt(i) != lineEnd) {
                continue;
            }
            if (i == text.length() && start == i) {
                break;
            }
            int end = i;
            while (end > start && text.charAt(end - 1) == '\r') {
                end--;
            }
            lines.add(new Line(lines.size() + 1, start, end));
            start = i + 1;
        }
        return List.copyOf(lines);
    }
}
