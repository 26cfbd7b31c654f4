package org.solewright.analysis.gait;

import java.util.List;

/**
 * One step-to-step transition between two stances that platforms saw.
 *
 * @param number from 1 within the pass
 * @param loads what the mechanics needs
 * @param length forward distance of the heels at their contacts, m; NaN where a heel is lost
 * @param width sideways distance of the heels at their contacts, m, positive where the feet do not cross
 * @param time contact to opposite contact, s
 * @param neighbourSpeeds mean forward pelvis speed of the steps before, at and after this one, contact to contact, m/s;
 *     those in view
 */
public record Step(
        int number, StepLoads loads, double length, double width, double time, List<Double> neighbourSpeeds) {

    /** Copies the list. */
    public Step {
        neighbourSpeeds = List.copyOf(neighbourSpeeds);
    }
}
