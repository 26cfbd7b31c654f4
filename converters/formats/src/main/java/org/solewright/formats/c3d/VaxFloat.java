package org.solewright.formats.c3d;

/** VAX F numbers: two little-endian 16-bit words, the higher one first. */
final class VaxFloat {

    private static final int EXPONENT = 0x7f800000;
    /** 129 exponents, which divide an IEEE number by four and leave it normal. */
    private static final int LEAST_NORMAL = 3 << 23;

    private VaxFloat() {}

    /**
     * The number that a little-endian 32-bit word of the file stands for: sign, exponent with excess 128, fraction below
     * a hidden 0.1; a quarter of what the bits mean in IEEE 754. Exponent 0 is 0 whatever the fraction.
     */
    static float of(int littleEndian) {
        int bits = Integer.rotateLeft(littleEndian, 16);
        int exponent = bits & EXPONENT;
        if (exponent >= LEAST_NORMAL) {
            return Float.intBitsToFloat(bits - (2 << 23));
        }
        if (exponent == 0) {
            return 0;
        }
        double fraction = ((bits & 0x7fffff) | 0x800000) / (double) (1 << 24);
        double value = Math.scalb(fraction, (exponent >>> 23) - 128);
        return (float) (bits < 0 ? -value : value);
    }

    /** From here on a number has no VAX F form. */
    static final float TOO_LARGE = 0x1p127f;

    /**
     * The little-endian 32-bit word for a number: -0 and what is smaller than 2^-128 become 0.
     *
     * @param value smaller than {@link #TOO_LARGE} in size
     */
    static int word(float value) {
        int bits = Float.floatToRawIntBits(value);
        int exponent = (bits & EXPONENT) >>> 23;
        if (exponent != 0) {
            return Integer.rotateLeft(bits + (2 << 23), 16);
        }
        // IEEE numbers below 2^-126 have no hidden bit; the largest of them are still VAX numbers.
        if (Math.abs(value) < 0x1p-128f) {
            return 0;
        }
        int scaled = Float.floatToRawIntBits(value * 0x1p10f);
        return Integer.rotateLeft(scaled - (8 << 23), 16);
    }
}
