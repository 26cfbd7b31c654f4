package org.solewright.analysis.dynamics;

/**
 * The simplest walking model with round feet, a hip spring and an impulsive push [Garcia et al. 1998; Kuo 2002; derived].
 * Lengths, times and masses are those for which limb length, gravity and hip mass are 1; the feet weigh nothing beside the
 * hip. State: lean of the stance limb, lean of the swing limb, forward positive, and their rates.
 *
 * @param slope rad, descending forward
 * @param rollingRatio radius of the feet over limb length, 0 to below 1
 * @param hipStiffness over foot mass, gravity and limb length
 * @param pushImpulse per hip mass, just before heel strike along contact to hip
 */
record WalkerModel(double slope, double rollingRatio, double hipStiffness, double pushImpulse) {

    /** Lean of the stance limb, of the swing limb, their rates. */
    static final int STATE = 4;
    /** Half angle, stance rate, push impulse, hip stiffness: what a step can be varied by. */
    static final int VARIED = 4;

    WalkerModel with(double push, double stiffness) {
        return new WalkerModel(slope, rollingRatio, stiffness, push);
    }

    /** Less of slope and push: by the square of the share, and by the share. */
    WalkerModel gentler(double share) {
        return new WalkerModel(slope * share * share, rollingRatio, hipStiffness, pushImpulse * share);
    }

    /** 1 less the rolling ratio. */
    double leg() {
        return 1 - rollingRatio;
    }

    /** Distance of the contact from the hip, squared, at a lean. */
    double squaredReach(double lean) {
        return rollingRatio * rollingRatio + leg() * leg() + 2 * rollingRatio * leg() * Math.cos(lean);
    }

    /** Slope of the hip's path: half the transition angle where both feet stand at that lean. */
    double contactAngle(double halfAngle) {
        return Math.atan2(leg() * Math.sin(halfAngle), rollingRatio + leg() * Math.cos(halfAngle));
    }

    double contactAngleRate(double halfAngle) {
        return leg() * (rollingRatio * Math.cos(halfAngle) + leg()) / squaredReach(halfAngle);
    }

    double stepLength(double halfAngle) {
        return 2 * rollingRatio * halfAngle + 2 * leg() * Math.sin(halfAngle);
    }

    /**
     * Rates of the state and of its variations.
     *
     * @param y the state, then four values for each of the four varied quantities; unmodified
     * @param out filled with the rates
     */
    void rates(double[] y, double[] out) {
        double r = rollingRatio;
        double c = leg();
        double sin = Math.sin(y[0]);
        double cos = Math.cos(y[0]);
        double w = y[2];
        double a = r * r + c * c + 2 * r * c * cos;
        double stance = (r * Math.sin(slope) + c * Math.sin(y[0] + slope) + r * c * sin * w * w) / a;
        double stanceByLean = (c * Math.cos(y[0] + slope) + r * c * cos * w * w + 2 * r * c * sin * stance) / a;
        double stanceByRate = 2 * r * c * sin * w / a;
        double ax = stance * (r + c * cos) - w * w * c * sin;
        double ay = -stance * c * sin - w * w * c * cos;
        double axByLean = stanceByLean * (r + c * cos) - stance * c * sin - w * w * c * cos;
        double axByRate = stanceByRate * (r + c * cos) - 2 * w * c * sin;
        double ayByLean = -stanceByLean * c * sin - stance * c * cos + w * w * c * sin;
        double ayByRate = -stanceByRate * c * sin - 2 * w * c * cos;
        double sinSwing = Math.sin(y[1]);
        double cosSwing = Math.cos(y[1]);
        double along = Math.sin(slope) - ax;
        double down = -Math.cos(slope) - ay;
        out[0] = w;
        out[1] = y[3];
        out[2] = stance;
        out[3] = -along * cosSwing + down * sinSwing + hipStiffness * (y[0] - y[1]);
        double swingByLean = axByLean * cosSwing - ayByLean * sinSwing + hipStiffness;
        double swingByRate = axByRate * cosSwing - ayByRate * sinSwing;
        double swingBySwing = along * sinSwing + down * cosSwing - hipStiffness;
        for (int at = STATE; at < y.length; at += STATE) {
            out[at] = y[at + 2];
            out[at + 1] = y[at + 3];
            out[at + 2] = stanceByLean * y[at] + stanceByRate * y[at + 2];
            out[at + 3] = swingByLean * y[at] + swingByRate * y[at + 2] + swingBySwing * y[at + 1];
        }
        // The last variation is that of the stiffness itself.
        if (y.length == STATE * (1 + VARIED)) {
            out[STATE * VARIED + 3] += y[0] - y[1];
        }
    }

    /**
     * The state just after heel strike, with its variations.
     *
     * @param halfAngle lean of both limbs
     * @param rate of the stance limb
     * @return state, then its derivatives by half angle, rate, push impulse and stiffness
     */
    double[] start(double halfAngle, double rate) {
        double beta = contactAngle(halfAngle);
        double betaRate = contactAngleRate(halfAngle);
        double reach = Math.sqrt(squaredReach(halfAngle));
        double reachRate = -rollingRatio * leg() * Math.sin(halfAngle) / reach;
        double cosine = Math.cos(2 * beta);
        double tangent = Math.tan(2 * beta);
        double after = rate * reach;
        double before = (after - pushImpulse * Math.sin(2 * beta)) / cosine;
        double less = Math.cos(beta - halfAngle);
        double more = Math.cos(beta + halfAngle);
        double[] y = new double[STATE * (1 + VARIED)];
        y[0] = -halfAngle;
        y[1] = halfAngle;
        y[2] = rate;
        y[3] = before / reach - before * less + after * more;
        double beforeByAngle = rate * reachRate / cosine - 2 * pushImpulse * betaRate + 2 * before * tangent * betaRate;
        double afterByAngle = rate * reachRate;
        y[4] = -1;
        y[5] = 1;
        y[7] = beforeByAngle / reach
                - before * reachRate / (reach * reach)
                - beforeByAngle * less
                + before * Math.sin(beta - halfAngle) * (betaRate - 1)
                + afterByAngle * more
                - after * Math.sin(beta + halfAngle) * (betaRate + 1);
        y[10] = 1;
        y[11] = 1 / cosine - reach / cosine * less + reach * more;
        y[15] = -tangent / reach + tangent * less;
        return y;
    }
}
