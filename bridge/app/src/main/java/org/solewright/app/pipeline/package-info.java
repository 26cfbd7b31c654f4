/** Use cases: from the user's files to results. No console: progress and findings go to the caller. */
@NullMarked
package org.solewright.app.pipeline;

import org.jspecify.annotations.NullMarked;
