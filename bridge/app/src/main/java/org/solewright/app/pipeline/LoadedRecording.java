package org.solewright.app.pipeline;

import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.motion.Recording;

/**
 * A recording and where it came from.
 *
 * @param recording in SI units
 * @param source name and SHA-256
 */
record LoadedRecording(Recording recording, SourceFile source) {}
