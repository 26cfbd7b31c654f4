/**
 * From point tracks and platform loads to walking frames, contacts, steps and the mechanics of the centre of mass.
 * Laboratory or walking frame as named, SI units.
 */
@NullMarked
package org.solewright.analysis.gait;

import org.jspecify.annotations.NullMarked;
