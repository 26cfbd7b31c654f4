/**
 * Benchmarks of the solver, each beside a yardstick of the same run: what is said about speed is a ratio. Built with the
 * profile {@code bench} alone.
 */
@NullMarked
package org.solewright.bench;

import org.jspecify.annotations.NullMarked;
