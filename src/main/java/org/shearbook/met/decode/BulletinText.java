package org.shearbook.met.decode;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;

/**
 * The characters of an input with the lines they stand on. A line ends at LF, at CR LF, at CR CR LF or at a lone CR.
 */
final class BulletinText {

    private final String text;
    private final int[] lineStarts;
    private final int lines;

    BulletinText(String text) {
        this.text = text;
        int[] starts = new int[16];
        int count = 1;
        for (int index = 0; index < text.length(); index++) {
            char c = text.charAt(index);
            boolean ends = c == '\n' || c == '\r' && !lineFeedFollows(index);
            if (ends) {
                if (count == starts.length) {
                    starts = Arrays.copyOf(starts, count * 2);
                }
                starts[count++] = index + 1;
            }
        }
        this.lineStarts = starts;
        this.lines = count;
    }

    private boolean lineFeedFollows(int carriageReturn) {
        int next = carriageReturn + 1;
        if (next < text.length() && text.charAt(next) == '\r') {
            next++;
        }
        return next < text.length() && text.charAt(next) == '\n';
    }

    /** Reads UTF-8, and Latin-1 where the bytes are not UTF-8, so that no byte is lost. */
    static BulletinText of(byte[] bytes) {
        try {
            String text = StandardCharsets.UTF_8.newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT)
                    .decode(ByteBuffer.wrap(bytes)).toString();
            return new BulletinText(text.startsWith("\uFEFF") ? text.substring(1) : text);
        } catch (CharacterCodingException notUtf8) {
            return new BulletinText(new String(bytes, StandardCharsets.ISO_8859_1));
        }
    }

    /** White space, and the control characters that frame a bulletin on the line. */
    static boolean isBlank(char c) {
        return c == ' ' || c == '\t' || c == '\r' || c == '\n' || c >= 1 && c <= 4;
    }

    /** As received. */
    String text() {
        return text;
    }

    String text(int from, int to) {
        return text.substring(from, to);
    }

    int length() {
        return text.length();
    }

    int lines() {
        return lines;
    }

    /** Index of the first character of a line, counted from 0. */
    int lineStart(int line) {
        return lineStarts[line];
    }

    /** Index behind the last character of a line, its ending included. */
    int lineEnd(int line) {
        return line + 1 < lines ? lineStarts[line + 1] : text.length();
    }

    /** Line of a character, from 1. */
    int lineAt(int index) {
        int found = Arrays.binarySearch(lineStarts, 0, lines, index);
        return found >= 0 ? found + 1 : -found - 1;
    }

    /** Column of a character in its line, from 1. */
    int columnAt(int index) {
        return index - lineStarts[lineAt(index) - 1] + 1;
    }

    /**
     * The same length in capitals, with every control character and every character outside ASCII as a blank: an
     * index means the same place in both.
     */
    String inCapitals() {
        char[] capitals = text.toCharArray();
        for (int index = 0; index < capitals.length; index++) {
            char c = capitals[index];
            if (c >= 'a' && c <= 'z') {
                capitals[index] = (char) (c - 'a' + 'A');
            } else if (c < ' ' || c > '~') {
                capitals[index] = ' ';
            }
        }
        return new String(capitals);
    }
}
