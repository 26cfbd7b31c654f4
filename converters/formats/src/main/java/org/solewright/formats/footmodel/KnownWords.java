package org.solewright.formats.footmodel;

import java.util.List;

/**
 * The words an attribute may have, for a clearer message than a schema gives.
 *
 * @param element local name of the element
 * @param attribute its attribute
 * @param noun what it names, for the message
 * @param words all allowed values
 */
record KnownWords(String element, String attribute, String noun, List<String> words) {

    KnownWords {
        words = List.copyOf(words);
    }
}
