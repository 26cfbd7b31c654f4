/** The command line: options, exit codes, what is printed. The only package that prints. */
@NullMarked
package org.solewright.app.cli;

import org.jspecify.annotations.NullMarked;
