/** Sides, force platforms and their loads, contacts and steps. */
@NullMarked
package org.solewright.domain.gait;

import org.jspecify.annotations.NullMarked;
