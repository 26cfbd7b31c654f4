/**
 * Whole studies: a folder of settings, subjects and trials becomes feet, appraisals and tables, one task at a time on
 * all cores. A ledger says what was done with which inputs; what is in it and unchanged is not done again. Also the
 * hand-over folder and the comparison of sessions. No console: progress goes to a listener.
 */
@NullMarked
package org.solewright.app.study;

import org.jspecify.annotations.NullMarked;
