package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import org.solewright.analysis.gait.Pass;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Stance;

/** The point frames of a pass in which one foot stood on platforms. */
final class StanceFrames {

    private StanceFrames() {}

    /** Zero-based frames, stance after stance. */
    static List<Integer> of(Pass pass, Side side) {
        List<Integer> frames = new ArrayList<>();
        for (Stance stance : pass.stances()) {
            if (stance.side() == side) {
                frames.addAll(of(pass, stance, 0, 1));
            }
        }
        return frames;
    }

    /** Frames of a part of a stance, from and to as shares of it. */
    static List<Integer> of(Pass pass, Stance stance, double from, double to) {
        double rate = pass.trial().rate();
        double start = stance.start() + from * stance.duration() - pass.trial().startTime();
        double end = stance.start() + to * stance.duration() - pass.trial().startTime();
        List<Integer> frames = new ArrayList<>();
        int last = (int) Math.floor(end * rate);
        for (int frame = (int) Math.max(0, Math.ceil(start * rate)); frame <= last; frame++) {
            frames.add(frame);
        }
        return frames;
    }
}
