package org.solewright.analysis.cost;

import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/** What halving the step does to a compass: work per distance at D/2 over that at D. */
public final class Halving {

    private Halving() {}

    /**
     * The ratio of work per distance; per step it is half of that.
     *
     * @param form how the work is counted
     * @param stepLength D, m
     * @param limbLength L, m
     * @return ratio; 1/2 for simultaneous work and small angles, above for noPush, below for pushOff
     * @throws LimitException as {@link VaultingStep#given} and {@link VaultingStep#factor}
     */
    public static double ratio(WorkForm form, double stepLength, double limbLength) throws LimitException {
        double whole = VaultingStep.given(0, stepLength, limbLength, 0, 1).factor(form);
        double half = VaultingStep.given(0, stepLength / 2, limbLength, 0, 1).factor(form);
        return 2 * half / whole;
    }
}
