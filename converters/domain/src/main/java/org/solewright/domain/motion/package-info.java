/** A recording in SI units: point tracks, analog-free timing and events. */
@NullMarked
package org.solewright.domain.motion;

import org.jspecify.annotations.NullMarked;
