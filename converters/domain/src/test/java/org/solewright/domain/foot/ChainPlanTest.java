package org.solewright.domain.foot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Optional;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Basis;

class ChainPlanTest {

    private static final ChainPlan.Shape SHAPE = new ChainPlan.Shape(0.03, 0.02, 0.02, 0.01);
    private static final ChainPlan.Place TIP = new ChainPlan.Place(Landmark.TOE_TIP, Optional.empty());

    private static void assertRefused(ThrowingCallable call, String message) {
        assertThatThrownBy(call).isInstanceOf(IllegalArgumentException.class).hasMessage(message);
    }

    private static Optional<ChainPlan.Hinge> joint(String name) {
        return Optional.of(new ChainPlan.Hinge(name, TIP, new ChainPlan.Axis.Along(ChainPlan.Direction.ACROSS)));
    }

    private static ChainPlan.Part part(SegmentName name, Optional<ChainPlan.Hinge> joint, Landmark... carried) {
        return new ChainPlan.Part(name, joint, SHAPE, Optional.empty(), List.of(carried));
    }

    private static ChainPlan.Part heavy(SegmentName name, Optional<ChainPlan.Hinge> joint, double share) {
        return new ChainPlan.Part(
                name, joint, SHAPE, Optional.of(new ChainPlan.MassShare(share, Basis.ASSUMED)), List.of());
    }

    private static ChainPlan plan(ChainPlan.Part... parts) {
        return new ChainPlan("", List.of(parts), TIP);
    }

    @Test
    void carriersAreTheLandmarksThatThePlanNames() {
        ChainPlan plan = plan(
                part(SegmentName.FOREFOOT, Optional.empty(), Landmark.CALCANEUS_POSTERIOR),
                part(SegmentName.PHALANX_1, joint("fetlock"), Landmark.TOE_TIP, Landmark.TOES_CLUSTER));
        assertThat(plan.carriers())
                .hasSize(3)
                .containsEntry(Landmark.CALCANEUS_POSTERIOR, SegmentName.FOREFOOT)
                .containsEntry(Landmark.TOES_CLUSTER, SegmentName.PHALANX_1);
    }

    @Test
    void chainsThatDoNotHangTogetherAreRefused() {
        ChainPlan.Part first = part(SegmentName.FOREFOOT, Optional.empty(), Landmark.TOE_TIP);
        assertRefused(ChainPlanTest::plan, "0 segments, expected at least 1");
        assertRefused(() -> plan(first, part(SegmentName.FOREFOOT, joint("a"))), "segment forefoot occurs twice");
        assertRefused(
                () -> plan(first, part(SegmentName.TOES, Optional.empty())), "segment toes has no joint, expected one");
        assertRefused(
                () -> plan(part(SegmentName.TOES, joint("a"))),
                "segment toes is the first and has a joint, expected none: it hangs on the ankle");
        assertRefused(() -> plan(first, part(SegmentName.TOES, joint("ankle"))), "joint ankle occurs twice");
        assertRefused(
                () -> plan(first, part(SegmentName.TOES, joint("a"), Landmark.TOE_TIP)),
                "landmark toe_tip is carried twice");
        assertRefused(
                () -> part(SegmentName.SHANK, Optional.empty()),
                "segment shank is part of every model, expected those of the foot");
    }

    @Test
    void shapesAndMassesAreMoreThanNothing() {
        assertRefused(() -> new ChainPlan.Shape(0.03, 0, 0.02, 0.01), "width or height 0.0 m, expected more than 0 m");
        assertRefused(
                () -> new ChainPlan.MassShare(1, Basis.ASSUMED),
                "mass share 1.0, expected more than 0 and less than 1");
        assertRefused(
                () -> plan(
                        heavy(SegmentName.FOREFOOT, Optional.empty(), 0.5), heavy(SegmentName.TOES, joint("a"), 0.5)),
                "mass shares sum to 1.0, expected less than 1");
    }

    @Test
    void toesAreAllThatLiesBeforeTheMetatarsals() {
        assertThat(SegmentName.FOREFOOT.isToe()).isFalse();
        assertThat(SegmentName.TOES.isToe()).isTrue();
        assertThat(SegmentName.PHALANX_5.isToe()).isTrue();
        assertThat(SegmentName.ofWord("phalanx_3")).contains(SegmentName.PHALANX_3);
        assertThat(SegmentName.ofWord("wing")).isEmpty();
    }
}
