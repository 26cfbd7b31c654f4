package org.solewright.domain.foot;

/**
 * A choice that a model was made with.
 *
 * @param name the option's name, without its hyphens
 * @param value as on the command line, or what the tool found
 */
public record Setting(String name, String value) {

    /** Checks that both say something. */
    public Setting {
        if (name.isBlank() || value.isBlank()) {
            throw new IllegalArgumentException("setting '" + name + "' of value '" + value + "', expected both");
        }
    }
}
