package org.solewright.domain.foot;

import java.util.Collections;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.solewright.domain.finding.Basis;

/**
 * A division of a foot by a laboratory's own plan, such as an animal's digit: segments from the ankle to the tip, each
 * with the joint that it hangs on, its shape and the landmarks it carries. The first segment hangs on the ankle, midway
 * between the malleoli.
 *
 * @param name what the laboratory calls it; may be empty
 * @param parts proximal to distal, at least one
 * @param tip the front end of the last segment
 */
public record ChainPlan(String name, List<Part> parts, Place tip) {

    /**
     * A place given by landmarks.
     *
     * @param landmark one landmark
     * @param other empty for the landmark itself, else the place is midway to this one
     */
    public record Place(Landmark landmark, Optional<Landmark> other) {}

    /** A direction of the model's axes in the standing trial. */
    public enum Direction {
        /** Along z, to the subject's right. */
        ACROSS,
        /** Along x. */
        FORWARD,
        /** Along y. */
        UP
    }

    /** How a joint's axis is given. */
    public sealed interface Axis {

        /**
         * Through two landmarks.
         *
         * @param from one
         * @param to the other
         */
        record Through(Landmark from, Landmark to) implements Axis {}

        /**
         * Along an axis of the model.
         *
         * @param direction which
         */
        record Along(Direction direction) implements Axis {}
    }

    /**
     * The joint at a segment's proximal end.
     *
     * @param name such as {@code metatarsophalangeal}
     * @param centre where it is
     * @param axis about which it turns
     */
    public record Hinge(String name, Place centre, Axis axis) {}

    /**
     * The elliptic frustum that stands for a segment, from its joint to the next one; whole widths and heights, m.
     *
     * @param proximalWidth across, at its joint
     * @param proximalHeight normal to that, at its joint
     * @param distalWidth across, at its front end
     * @param distalHeight normal to that, at its front end
     */
    public record Shape(double proximalWidth, double proximalHeight, double distalWidth, double distalHeight) {

        /** Checks that all are more than 0. */
        public Shape {
            for (double d : new double[] {proximalWidth, proximalHeight, distalWidth, distalHeight}) {
                if (!(d > 0 && Double.isFinite(d))) {
                    throw new IllegalArgumentException("width or height " + d + " m, expected more than 0 m");
                }
            }
        }
    }

    /**
     * Mass of a segment as the plan gives it.
     *
     * @param share of body mass, more than 0 and less than 1
     * @param basis where it comes from
     */
    public record MassShare(double share, Basis basis) {

        /** Checks the share. */
        public MassShare {
            if (!(share > 0 && share < 1)) {
                throw new IllegalArgumentException("mass share " + share + ", expected more than 0 and less than 1");
            }
        }
    }

    /**
     * A segment of the plan.
     *
     * @param name which
     * @param joint at its proximal end; empty for the first segment, which hangs on the ankle
     * @param shape for its inertia
     * @param mass empty where density and shape give it
     * @param landmarks that it carries
     */
    public record Part(
            SegmentName name, Optional<Hinge> joint, Shape shape, Optional<MassShare> mass, List<Landmark> landmarks) {

        /** Copies the list. */
        public Part {
            landmarks = List.copyOf(landmarks);
            if (name == SegmentName.SHANK) {
                throw new IllegalArgumentException("segment shank is part of every model, expected those of the foot");
            }
        }
    }

    /** Copies the list; checks joints, names and landmarks. */
    public ChainPlan {
        parts = List.copyOf(parts);
        if (parts.isEmpty()) {
            throw new IllegalArgumentException("0 segments, expected at least 1");
        }
        Set<SegmentName> names = new HashSet<>();
        Set<Landmark> carried = new HashSet<>();
        Set<String> joints = new HashSet<>(Set.of("ankle"));
        for (int i = 0; i < parts.size(); i++) {
            Part part = parts.get(i);
            String word = part.name().word();
            if (!names.add(part.name())) {
                throw new IllegalArgumentException("segment " + word + " occurs twice");
            }
            if (i == 0 == part.joint().isPresent()) {
                throw new IllegalArgumentException(
                        i == 0
                                ? "segment " + word
                                        + " is the first and has a joint, expected none: it hangs on the ankle"
                                : "segment " + word + " has no joint, expected one");
            }
            part.joint().ifPresent(j -> {
                if (!joints.add(j.name())) {
                    throw new IllegalArgumentException("joint " + j.name() + " occurs twice");
                }
            });
            for (Landmark landmark : part.landmarks()) {
                if (!carried.add(landmark)) {
                    throw new IllegalArgumentException("landmark " + landmark.word() + " is carried twice");
                }
            }
        }
        double total = parts.stream()
                .flatMap(p -> p.mass().stream())
                .mapToDouble(MassShare::share)
                .sum();
        if (!(total < 1)) {
            throw new IllegalArgumentException("mass shares sum to " + total + ", expected less than 1");
        }
    }

    /**
     * Which segment carries which landmark.
     *
     * @return only the landmarks that the plan names
     */
    public Map<Landmark, SegmentName> carriers() {
        Map<Landmark, SegmentName> carriers = new EnumMap<>(Landmark.class);
        parts.forEach(p -> p.landmarks().forEach(l -> carriers.put(l, p.name())));
        return Collections.unmodifiableMap(carriers);
    }
}
