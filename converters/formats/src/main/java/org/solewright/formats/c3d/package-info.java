/**
 * C3D recordings, read carefully (the public C3D file format guide, and what real files make of it) and written.
 *
 * <p>{@link org.solewright.formats.c3d.C3dFile} holds a file's content in the file's own units;
 * {@link org.solewright.formats.c3d.C3dFile#toRecording()} turns it into SI units and force-platform loads. Every doubt is
 * a finding. Not in: gait, filters, anything that needs more than the file's own rules.
 */
@NullMarked
package org.solewright.formats.c3d;

import org.jspecify.annotations.NullMarked;
