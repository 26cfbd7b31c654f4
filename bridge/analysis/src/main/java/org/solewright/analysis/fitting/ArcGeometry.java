package org.solewright.analysis.fitting;

/**
 * A circle or straight line by a reference point, the direction of a normal there, the offset along it to the curve and
 * the curvature. Regular at curvature 0.
 *
 * @param referenceX reference point, m
 * @param referenceY reference point, m
 * @param direction angle of the normal that points to the centre of a positive curvature, rad
 * @param offset signed distance from the reference to the curve along the normal, m
 * @param curvature 1/m
 */
record ArcGeometry(double referenceX, double referenceY, double direction, double offset, double curvature) {

    /** The same curve with its normal towards growing y. */
    ArcGeometry upward() {
        if (Math.sin(direction) < 0) {
            return new ArcGeometry(
                    referenceX,
                    referenceY,
                    Math.IEEEremainder(direction + Math.PI, 2 * Math.PI),
                    0.0 - offset,
                    0.0 - curvature);
        }
        return this;
    }

    double along(double x, double y) {
        return (x - referenceX) * Math.sin(direction) - (y - referenceY) * Math.cos(direction);
    }

    double above(double x, double y) {
        return (x - referenceX) * Math.cos(direction) + (y - referenceY) * Math.sin(direction) - offset;
    }

    /** Root of the squared distance to the centre over the squared radius; 1 on the curve and on any line. */
    double ratio(double along, double above) {
        double q = 1 - 2 * curvature * above + curvature * curvature * (along * along + above * above);
        return Math.sqrt(Math.max(q, 0));
    }

    double distance(double x, double y) {
        double a = above(x, y);
        double b = along(x, y);
        return (2 * a - curvature * (a * a + b * b)) / (1 + ratio(b, a));
    }

    /** Arc length from the curve's point nearest the reference to the foot of a point. */
    double length(double x, double y) {
        double a = above(x, y);
        double b = along(x, y);
        double turn = Math.atan2(curvature * b, 1 - curvature * a);
        return curvature == 0 ? b : turn / curvature;
    }

    double centreX() {
        return referenceX + Math.cos(direction) * (offset + 1 / curvature);
    }

    double centreY() {
        return referenceY + Math.sin(direction) * (offset + 1 / curvature);
    }

    double x(double length) {
        return referenceX + Math.cos(direction) * (offset + rise(length)) + Math.sin(direction) * run(length);
    }

    double y(double length) {
        return referenceY + Math.sin(direction) * (offset + rise(length)) - Math.cos(direction) * run(length);
    }

    private double run(double length) {
        return curvature == 0 ? length : Math.sin(curvature * length) / curvature;
    }

    private double rise(double length) {
        if (curvature == 0) {
            return 0;
        }
        double half = Math.sin(curvature * length / 2);
        return 2 * half * half / curvature;
    }
}
