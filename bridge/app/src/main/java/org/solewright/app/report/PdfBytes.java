package org.solewright.app.report;

import java.nio.charset.StandardCharsets;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Takes the clock out of a PDF: times and the random identifier, whose lengths stay, so that no offset moves. */
final class PdfBytes {

    private static final Pattern TIME = Pattern.compile("D:\\d{14}(?:[+-]\\d{2}'\\d{2}'|Z)");
    private static final Pattern XMP_TIME =
            Pattern.compile("\\d{4}-\\d{2}-\\d{2}T\\d{2}:\\d{2}:\\d{2}(?:\\.\\d+)?(?:[+-]\\d{2}:\\d{2}|Z)");
    private static final Pattern IDENTIFIER = Pattern.compile("/ID \\[<([0-9A-F]+)> <([0-9A-F]+)>\\]");

    private PdfBytes() {}

    static byte[] fixed(byte[] pdf) {
        // One byte is one character, there and back.
        String text = new String(pdf, StandardCharsets.ISO_8859_1);
        text = replaced(TIME, text, "20000101000000");
        text = replaced(XMP_TIME, text, "2000-01-01T00:00:00");
        Matcher m = IDENTIFIER.matcher(text);
        StringBuilder out = new StringBuilder();
        while (m.find()) {
            m.appendReplacement(out, m.group().replaceAll("[0-9A-F]{2}", "00"));
        }
        return m.appendTail(out).toString().getBytes(StandardCharsets.ISO_8859_1);
    }

    /** The digits of the time change, its length and zone do not. */
    private static String replaced(Pattern pattern, String text, String time) {
        Matcher m = pattern.matcher(text);
        StringBuilder out = new StringBuilder();
        while (m.find()) {
            String found = m.group();
            String fixed = found.startsWith("D:")
                    ? "D:" + time + found.substring(2 + time.length())
                    : time + found.substring(time.length());
            m.appendReplacement(out, Matcher.quoteReplacement(fixed));
        }
        return m.appendTail(out).toString();
    }
}
