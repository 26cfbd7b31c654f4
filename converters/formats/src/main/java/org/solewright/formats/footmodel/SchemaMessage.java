package org.solewright.formats.footmodel;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What the schema's check says, in English. The platform's messages come in the language of the user's locale whatever
 * is asked; their rule's name in front and the quoted words are the same in all.
 */
final class SchemaMessage {

    private static final Pattern RULE = Pattern.compile("^(cvc-[A-Za-z0-9.-]+?)\\.?: ");
    private static final Pattern QUOTED = Pattern.compile("'([^']*)'");

    private SchemaMessage() {}

    static String english(String message) {
        Matcher rule = RULE.matcher(message);
        if (!rule.find()) {
            return withoutStop(message);
        }
        String rest = message.substring(rule.end());
        List<String> words = new ArrayList<>();
        QUOTED.matcher(rest).results().forEach(r -> words.add(r.group(1).replaceAll("\"[^\"]*\":", "")));
        String first = words.isEmpty() ? "" : words.get(0).replaceAll("[{}]", "");
        String second = words.size() < 2 ? "" : words.get(1);
        return switch (rule.group(1)) {
            case "cvc-complex-type.2.4.a" -> "element '" + first + "', expected " + second;
            case "cvc-complex-type.2.4.b" -> "element '" + first + "' is not complete, expected " + second;
            case "cvc-complex-type.2.4.d", "cvc-complex-type.2.4.e", "cvc-complex-type.2.4.f" ->
                "element '" + first + "', expected no more here";
            case "cvc-complex-type.3.2.2" ->
                "attribute '" + first + "' of element '" + second + "', expected none such";
            case "cvc-complex-type.4" -> "element '" + second + "' without attribute '" + first + "'";
            case "cvc-complex-type.2.1", "cvc-complex-type.2.3" -> "text in element '" + first + "', expected none";
            case "cvc-datatype-valid.1.2.1" -> "'" + first + "', expected a value of type " + second;
            case "cvc-enumeration-valid" -> "'" + first + "', expected one of " + bracketed(rest, second);
            case "cvc-pattern-valid" -> "'" + first + "', expected the form " + second;
            default -> withoutStop(rest);
        };
    }

    private static String bracketed(String text, String otherwise) {
        int from = text.indexOf('[');
        int to = text.indexOf(']');
        return from >= 0 && to > from ? text.substring(from + 1, to) : otherwise;
    }

    private static String withoutStop(String message) {
        String text = message.strip();
        return text.endsWith(".") ? text.substring(0, text.length() - 1) : text;
    }
}
