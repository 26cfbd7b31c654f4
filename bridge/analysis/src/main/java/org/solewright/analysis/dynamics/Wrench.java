package org.solewright.analysis.dynamics;

import org.solewright.domain.geometry.Vec3;

/**
 * A force and a moment about a stated point.
 *
 * @param force N
 * @param moment about {@code about}, N m
 * @param about point, m, in the frame of force and moment
 */
public record Wrench(Vec3 force, Vec3 moment, Vec3 about) {

    /** No load. */
    public static final Wrench NONE = new Wrench(Vec3.ZERO, Vec3.ZERO, Vec3.ZERO);

    /**
     * The same load about another point.
     *
     * @param point m
     * @return a wrench of equal effect on a rigid body
     */
    public Wrench at(Vec3 point) {
        return new Wrench(force, moment.plus(about.minus(point).cross(force)), point);
    }

    /**
     * Both loads together.
     *
     * @param o the other load, same frame
     * @return their sum about this one's point
     */
    public Wrench plus(Wrench o) {
        Wrench moved = o.at(about);
        return new Wrench(force.plus(moved.force), moment.plus(moved.moment), about);
    }

    /**
     * What the other body feels.
     *
     * @return force and moment turned round, about the same point
     */
    public Wrench reversed() {
        return new Wrench(force.times(-1), moment.times(-1), about);
    }
}
