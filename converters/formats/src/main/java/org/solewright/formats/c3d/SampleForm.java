package org.solewright.formats.c3d;

import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import java.util.Locale;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.geometry.Vec3;
import org.solewright.formats.io.FormatException;

/**
 * How the samples of a file go into another form: the scale of points and channels, word by word. Reals to reals and
 * integers to integers keep every bit; reals become integers by the finest scale that holds all of them.
 */
final class SampleForm {

    private static final int LARGEST = 32767;
    private static final int LARGEST_BYTE = 255;
    private static final int UNSIGNED = 65535;

    private final C3dFile file;
    private final C3dCopy.Wanted wanted;
    private final int perFrame;
    private final double scale;
    private final double unitsPerMetre;
    private final boolean isWordKept;
    private final boolean isAnalogRescaled;
    private final double[] analogSteps;
    private final double general;

    private SampleForm(
            C3dFile file,
            C3dCopy.Wanted wanted,
            int perFrame,
            double scale,
            double unitsPerMetre,
            boolean isAnalogRescaled,
            double[] analogSteps,
            double general) {
        this.file = file;
        this.wanted = wanted;
        this.perFrame = perFrame;
        this.scale = scale;
        this.unitsPerMetre = unitsPerMetre;
        this.isWordKept = wanted.isReal() || !file.isReal();
        this.isAnalogRescaled = isAnalogRescaled;
        this.analogSteps = analogSteps;
        this.general = general;
    }

    static SampleForm of(C3dFile file, C3dCopy.Wanted wanted, int perFrame, List<Finding> findings)
            throws FormatException {
        double stored = file.points().residualScale();
        double metres = LengthUnit.metres(file.unit())
                .or(() -> LengthUnit.fitting(file.platforms()))
                .orElse(1e-3);
        double scale = wanted.isReal() ? -stored : file.isReal() ? finest(file, wanted, metres) : stored;
        if (scale == 0) {
            scale = wanted.isReal() ? -1 : 1;
        }
        boolean isRescaled = !wanted.isReal() && file.isReal() && !isAnalogWhole(file);
        double stated = file.parameters().number("ANALOG", "GEN_SCALE");
        double general = Double.isNaN(stated) || stated == 0 ? 1 : stated;
        double[] steps = isRescaled ? steps(file, wanted, perFrame, general, findings) : new double[0];
        SampleForm form = new SampleForm(file, wanted, perFrame, scale, 1 / metres, isRescaled, steps, general);
        form.check(findings);
        form.checkAdded(findings);
        form.sayStep(findings);
        return form;
    }

    /** The finest scale that holds every coordinate, also of computed points, and every residual. */
    private static double finest(C3dFile file, C3dCopy.Wanted wanted, double metres) {
        C3dPoints p = file.points();
        double farthest = 0;
        double residual = 0;
        for (int frame = wanted.first(); frame <= wanted.last(); frame++) {
            for (int point = 0; point < p.points(); point++) {
                if (p.isValid(frame, point)) {
                    for (int c = 0; c < 3; c++) {
                        farthest = Math.max(farthest, Math.abs(p.coordinate(frame, point, c)));
                    }
                    residual = Math.max(residual, p.residual(frame, point));
                }
            }
        }
        for (AddedPoint a : wanted.points()) {
            for (int frame = wanted.first(); frame <= wanted.last(); frame++) {
                if (a.track().isValid(frame)) {
                    farthest = Math.max(farthest, size(a.track().at(frame)) / metres);
                }
            }
        }
        return step(Math.max(farthest / LARGEST, residual / LARGEST_BYTE));
    }

    private static double size(Vec3 v) {
        return Math.max(Math.abs(v.x()), Math.max(Math.abs(v.y()), Math.abs(v.z())));
    }

    /**
     * A float just above the quotient, so that the largest number does not round over the edge; 1 where all is 0. A normal
     * number, which every processor can hold.
     */
    private static double step(double quotient) {
        return quotient == 0 ? 1 : Math.max(Float.MIN_NORMAL, Math.nextUp((float) quotient));
    }

    /** Whether all analog words are integers that 16 bits hold, as converters deliver them. */
    private static boolean isAnalogWhole(C3dFile file) {
        C3dAnalog a = file.analog();
        boolean isUnsigned = file.parameters()
                .find("ANALOG", "FORMAT")
                .map(f -> f.text(0).equalsIgnoreCase("UNSIGNED"))
                .orElse(false);
        float low = isUnsigned ? 0 : -LARGEST - 1;
        float high = isUnsigned ? UNSIGNED : LARGEST;
        for (int i = 0; i < a.samples(); i++) {
            for (int k = 0; k < a.channels(); k++) {
                float v = a.stored(i, k);
                if (!(v >= low && v <= high) || v != Math.rint(v)) {
                    return false;
                }
            }
        }
        return true;
    }

    /** Quantisation step of each channel in its own unit. */
    private static double[] steps(
            C3dFile file, C3dCopy.Wanted wanted, int perFrame, double general, List<Finding> findings) {
        C3dAnalog a = file.analog();
        double[] steps = new double[a.channels()];
        int lost = 0;
        for (int k = 0; k < steps.length; k++) {
            double largest = 0;
            for (int i = wanted.first() * perFrame; i < (wanted.last() + 1) * perFrame; i++) {
                double v = Math.abs(a.value(i, k));
                if (Double.isFinite(v)) {
                    largest = Math.max(largest, v);
                } else {
                    lost++;
                }
            }
            steps[k] = step(largest / LARGEST / Math.abs(general));
        }
        if (lost > 0) {
            findings.add(Finding.warning(
                    "analog.not-finite",
                    "ANALOG",
                    lost + " analog samples are no finite numbers and are written as 0: integers have no such"));
        }
        return steps;
    }

    /** Says or refuses what the wanted form cannot hold. */
    private void check(List<Finding> findings) throws FormatException {
        boolean isVax = wanted.processor() == Processor.DEC && wanted.isReal();
        int words = 0;
        int places = 0;
        C3dPoints p = file.points();
        for (int frame = wanted.first(); frame <= wanted.last(); frame++) {
            for (int point = 0; point < p.points(); point++) {
                for (int c = 0; c < 3; c++) {
                    float v = p.stored(frame, point, c);
                    if (!Float.isFinite(v)) {
                        places++;
                    } else if (isVax && Math.abs(v) >= VaxFloat.TOO_LARGE) {
                        throw tooLarge("coordinate", v);
                    }
                }
                float w = p.stored(frame, point, 3);
                boolean isHeld = wanted.isReal()
                        ? !isVax || Math.abs(w) < VaxFloat.TOO_LARGE
                        : w >= -LARGEST - 1 && w <= UNSIGNED;
                words += isHeld ? 0 : 1;
            }
        }
        for (int i = wanted.first() * perFrame; isVax && i < (wanted.last() + 1) * perFrame; i++) {
            for (int k = 0; k < file.analog().channels(); k++) {
                float v = file.analog().stored(i, k);
                if (!(Math.abs(v) < VaxFloat.TOO_LARGE)) {
                    throw tooLarge("analog sample", v);
                }
            }
        }
        if (words > 0) {
            findings.add(Finding.note(
                    "points.word-replaced",
                    "POINT",
                    words + " fourth words outside 16 bits have no form here and are written as 0: valid, residual 0"));
        }
        if (places > 0 && (isVax || !wanted.isReal())) {
            findings.add(Finding.note(
                    "points.place-replaced",
                    "POINT",
                    places + " coordinates are no finite numbers; their samples are written as missing"));
        }
    }

    /** A scale of the file that is kept, and VAX numbers, do not reach everywhere. */
    private void checkAdded(List<Finding> findings) {
        int out = 0;
        for (AddedPoint a : wanted.points()) {
            for (int frame = wanted.first(); frame <= wanted.last(); frame++) {
                out += a.track().isValid(frame) && !isHeld(a.track().at(frame)) ? 1 : 0;
            }
        }
        if (out > 0) {
            findings.add(Finding.warning(
                    "points.added-outside",
                    "POINT",
                    out + " computed samples lie farther out than the written numbers reach and are missing"));
        }
    }

    private boolean isHeld(Vec3 metres) {
        double size = size(metres) * unitsPerMetre;
        return wanted.isReal() ? size < VaxFloat.TOO_LARGE : Math.rint(size / scale) <= LARGEST;
    }

    private void sayStep(List<Finding> findings) {
        if (!wanted.isReal() && file.isReal() && file.frames() > 0) {
            findings.add(Finding.note(
                    "samples.quantised",
                    "",
                    "the points are written in steps of "
                            + String.format(Locale.ROOT, "%.3g", scale)
                            + (file.unit().isEmpty() ? "" : " " + file.unit())
                            + (isAnalogRescaled
                                    ? ", each analog channel in 32767 steps up to its largest value"
                                    : ", the analog samples as they are")
                            + "; half a step is lost at most"));
        }
    }

    private FormatException tooLarge(String what, float value) {
        return new FormatException(
                file.name(),
                "an " + (what.startsWith("a") ? what : "point's " + what) + " is " + value
                        + ", which has no form in VAX numbers",
                "write it for another processor or as integers");
    }

    /** POINT:SCALE. */
    double scale() {
        return scale;
    }

    boolean isAnalogRescaled() {
        return isAnalogRescaled;
    }

    /** ANALOG:SCALE of every channel where it is a new one. */
    double[] analogScales() {
        return analogSteps.clone();
    }

    /** Writes frames; returns how many bytes they took. */
    long write(int first, int frames, OutputStream out) throws IOException {
        WordOutput words = new WordOutput(out, wanted.processor());
        C3dPoints p = file.points();
        for (int frame = first; frame < first + frames; frame++) {
            for (int point = 0; point < p.points(); point++) {
                point(words, p, frame, point);
            }
            for (AddedPoint a : wanted.points()) {
                added(words, a, frame);
            }
            for (int i = frame * perFrame; i < (frame + 1) * perFrame; i++) {
                for (int k = 0; k < file.analog().channels(); k++) {
                    analog(words, i, k);
                }
            }
        }
        words.flush();
        long perPoint = 4L * (p.points() + wanted.points().size());
        return frames * (perPoint + (long) perFrame * file.analog().channels()) * (wanted.isReal() ? 4 : 2);
    }

    private void point(WordOutput out, C3dPoints p, int frame, int point) throws IOException {
        float x = p.stored(frame, point, 0);
        float y = p.stored(frame, point, 1);
        float z = p.stored(frame, point, 2);
        float w = p.stored(frame, point, 3);
        boolean isPlace = Float.isFinite(x) && Float.isFinite(y) && Float.isFinite(z);
        boolean isVax = wanted.processor() == Processor.DEC;
        if (wanted.isReal()) {
            if (!isPlace && isVax) {
                missing(out);
                return;
            }
            double factor = file.isReal() ? 1 : Math.abs(scale);
            out.real(file.isReal() ? x : (float) (x * factor));
            out.real(file.isReal() ? y : (float) (y * factor));
            out.real(file.isReal() ? z : (float) (z * factor));
            boolean isReplaced = p.isFlagOverridden(frame, point) || (isVax && !(Math.abs(w) < VaxFloat.TOO_LARGE));
            out.real(isReplaced ? 0 : w);
            return;
        }
        if (isWordKept) {
            out.integer((int) x);
            out.integer((int) y);
            out.integer((int) z);
            out.integer(p.isFlagOverridden(frame, point) ? 0 : (int) w);
            return;
        }
        if (!p.isValid(frame, point)) {
            out.integer(quantised(x));
            out.integer(quantised(y));
            out.integer(quantised(z));
            out.integer(isPlace && w >= -LARGEST - 1 && w < 0 ? (int) w : -1);
            return;
        }
        out.integer(quantised(x));
        out.integer(quantised(y));
        out.integer(quantised(z));
        int residual = (int) Math.min(LARGEST_BYTE, Math.rint(p.residual(frame, point) / scale));
        out.integer(p.cameras(frame, point) << 8 | residual);
    }

    private int quantised(float value) {
        double v = Math.rint(value / scale);
        return Math.abs(v) <= LARGEST ? (int) v : 0;
    }

    private void missing(WordOutput out) throws IOException {
        for (int c = 0; c < 3; c++) {
            out.real(0);
        }
        out.real(-1);
    }

    private void added(WordOutput out, AddedPoint a, int frame) throws IOException {
        Vec3 at = a.track().at(frame);
        boolean isValid = a.track().isValid(frame) && isHeld(at);
        for (int c = 0; c < 3; c++) {
            double v = isValid ? (c == 0 ? at.x() : c == 1 ? at.y() : at.z()) * unitsPerMetre : 0;
            if (wanted.isReal()) {
                out.real((float) v);
            } else {
                out.integer(quantised((float) v));
            }
        }
        if (wanted.isReal()) {
            out.real(isValid ? 0 : -1);
        } else {
            out.integer(isValid ? 0 : -1);
        }
    }

    private void analog(WordOutput out, int sample, int channel) throws IOException {
        float v = file.analog().stored(sample, channel);
        if (wanted.isReal()) {
            out.real(v);
        } else if (isAnalogRescaled) {
            double value = file.analog().value(sample, channel);
            double step = analogSteps[channel] * general;
            out.integer(Double.isFinite(value) ? (int) Math.rint(value / step) : 0);
        } else {
            out.integer((int) v);
        }
    }
}
