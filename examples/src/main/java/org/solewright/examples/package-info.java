/** Programs that use Solewright as a library. */
@NullMarked
package org.solewright.examples;

import org.jspecify.annotations.NullMarked;
