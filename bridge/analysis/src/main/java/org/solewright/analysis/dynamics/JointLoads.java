package org.solewright.analysis.dynamics;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.geometry.Vec3;

/**
 * Inverse dynamics of a chain of rigid segments by the equations of Newton and Euler, from its last segment upwards: what
 * the segment above exerts on each segment at their joint.
 *
 * <p>The loads on the chain must be complete. One wrench per foot says nothing about how the segments of that foot share
 * it: ask {@link FootLoadRule} which joints inside the foot may be looked at.
 */
public final class JointLoads {

    private final List<ChainLink> chain;
    private final List<Wrench> joints;

    private JointLoads(List<ChainLink> chain, List<Wrench> joints) {
        this.chain = chain;
        this.joints = joints;
    }

    /**
     * Solves one instant.
     *
     * @param chain segments proximal to distal, each hanging on the one before it
     * @param gravity acceleration of free fall, laboratory frame, m/s2
     * @return the joints' loads
     */
    public static JointLoads of(List<ChainLink> chain, Vec3 gravity) {
        List<Wrench> joints = new ArrayList<>();
        Wrench distal = Wrench.NONE;
        for (int i = chain.size() - 1; i >= 0; i--) {
            ChainLink link = chain.get(i);
            Wrench needed = link.inertialLoad(gravity).at(link.joint());
            Wrench there = link.external().plus(distal.reversed()).at(link.joint());
            distal = needed.plus(there.reversed());
            joints.add(0, distal);
        }
        return new JointLoads(List.copyOf(chain), List.copyOf(joints));
    }

    /**
     * The load of the segment above on a segment.
     *
     * @param segment its index in the chain
     * @return force and moment about the joint's centre, laboratory frame
     */
    public Wrench on(int segment) {
        return joints.get(segment);
    }

    /**
     * Power that a joint gives to its two segments: M . (w_distal - w_proximal) + F . (v_distal - v_proximal), the
     * velocities being those of either segment's point at the joint's centre; the second term is 0 where the segments
     * share it, and what the joint's soft parts take where they do not ([Zelik and Honert 2018]).
     *
     * @param segment index of the distal segment, 1 or more
     * @return W, positive where the joint does work on the segments
     */
    public double power(int segment) {
        SegmentState proximal = chain.get(segment - 1).state();
        SegmentState distal = chain.get(segment).state();
        Wrench load = joints.get(segment);
        return load.moment().dot(distal.w().minus(proximal.w()))
                + load.force().dot(distal.velocityAt(load.about()).minus(proximal.velocityAt(load.about())));
    }
}
