/** A study as its laboratory states it: settings, subjects, trials. Words and numbers, no files. */
@NullMarked
package org.solewright.domain.study;

import org.jspecify.annotations.NullMarked;
