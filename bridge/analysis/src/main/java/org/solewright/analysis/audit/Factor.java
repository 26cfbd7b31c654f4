package org.solewright.analysis.audit;

import java.math.BigDecimal;
import java.math.MathContext;

/** A factor as it stands in a message. */
final class Factor {

    private static final MathContext DIGITS = new MathContext(3);

    private static final MathContext ROUGH = new MathContext(2);
    private static final double NEAR = 0.1;

    private Factor() {}

    /** Three digits, no more than it takes: 2, 4.45, 1000, 0.001. */
    static String text(double factor) {
        return new BigDecimal(factor).round(DIGITS).stripTrailingZeros().toPlainString();
    }

    /** A power of ten where the factor is within a tenth of it, else two digits. */
    static String rough(double factor) {
        double power = Math.pow(10, Math.rint(Math.log10(Math.abs(factor))));
        boolean isPower = Math.abs(Math.abs(factor) / power - 1) < NEAR;
        return isPower
                ? text(Math.copySign(power, factor))
                : new BigDecimal(factor).round(ROUGH).stripTrailingZeros().toPlainString();
    }
}
