package org.solewright.domain.foot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;

class FootValuesTest {

    private static void assertRefused(ThrowingCallable call, String message) {
        assertThatThrownBy(call).isInstanceOf(IllegalArgumentException.class).hasMessage(message);
    }

    private static Subject subject(double mass) {
        return new Subject(
                "demo-01",
                Quantity.of(mass, Basis.MEASURED),
                Optional.empty(),
                Quantity.of(0.9, Basis.MEASURED),
                Optional.empty(),
                Optional.empty(),
                Population.UNKNOWN,
                Optional.empty());
    }

    private static Segment segment(SegmentName name, Optional<SegmentName> parent, double mass) {
        return new Segment(
                name,
                parent,
                Quantity.of(mass, Basis.MEASURED),
                Located.of(Vec3.ZERO, Basis.MEASURED),
                InertiaTensor.principal(1, 1, 1),
                Basis.MEASURED,
                Quantity.of(0.1, Basis.MEASURED),
                true);
    }

    private static FootModel model(List<Segment> segments, List<LandmarkPosition> landmarks) {
        return new FootModel(
                Side.RIGHT,
                "1",
                subject(80),
                List.of(),
                segments,
                List.of(),
                landmarks,
                Rolling.UNKNOWN,
                List.of(),
                List.of(),
                List.of());
    }

    @Test
    void modelsPartsNameItsOwnSegments() {
        Segment shank = segment(SegmentName.SHANK, Optional.empty(), 3);
        Segment foot = segment(SegmentName.FOOT, Optional.of(SegmentName.SHANK), 1);
        FootModel model = model(List.of(shank, foot), List.of());
        assertThat(model.segment(SegmentName.FOOT)).contains(foot);
        assertThat(model.segment(SegmentName.TOES)).isEmpty();
        assertThat(model.joint("ankle")).isEmpty();
        assertRefused(
                () -> model(List.of(foot), List.of()), "parent of foot names segment shank, which the model has not");
        assertRefused(
                () -> model(List.of(shank), List.of(new LandmarkPosition("toe_tip", SegmentName.TOES, Vec3.ZERO))),
                "landmark toe_tip names segment toes, which the model has not");
        assertRefused(() -> model(List.of(shank, shank), List.of()), "a segment occurs twice in [SHANK, SHANK]");
    }

    @Test
    void massesAndLengthsAreMoreThanZero() {
        assertRefused(
                () -> segment(SegmentName.FOOT, Optional.empty(), -0.2), "foot mass -0.2 kg, expected more than 0 kg");
        assertRefused(() -> subject(0), "body mass 0.0 kg, expected more than 0 kg");
        assertRefused(() -> Quantity.of(Double.NaN, Basis.MEASURED), "quantity NaN, expected a finite number");
        assertRefused(() -> Quantity.of(1, Basis.MEASURED, -1), "standard deviation -1.0, expected 0 or more");
    }

    @Test
    void jointsHaveAsManyAxesAsTheirKind() {
        Joint.Axis axis = new Joint.Axis("talocrural", Vec3.Z, Basis.MEASURED, OptionalDouble.empty());
        assertRefused(
                () -> new Joint(
                        "ankle",
                        SegmentName.SHANK,
                        SegmentName.FOOT,
                        Joint.Kind.UNIVERSAL,
                        Located.of(Vec3.ZERO, Basis.MEASURED),
                        List.of(axis),
                        Optional.empty(),
                        Optional.empty()),
                "joint ankle is a universal and has 1 axes, expected 2");
        assertRefused(
                () -> new Joint.Axis("a", new Vec3(0, 0, 2), Basis.MEASURED, OptionalDouble.empty()),
                "axis a has length 2.0, expected 1");
        assertRefused(() -> new Joint.Range(1, 0, Basis.MEASURED), "joint range from 1.0 to 0.0 rad");
        assertRefused(() -> new Joint.Lock(0, 101, Basis.MEASURED), "lock over 101.0 % of stance, expected 0 to 100 %");
    }

    @Test
    void flatArcHasInfiniteRadiusAndNoFailure() {
        Rolling.Arc flat = new Rolling.Arc(
                Rolling.Frame.LIMB,
                0,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                0.2,
                0.001,
                1);
        assertThat(flat.radius()).isInfinite();
        assertThat(new Rolling(List.of(flat), List.of(), List.of(), Optional.empty()).arc(Rolling.Frame.SHANK))
                .isEmpty();
    }

    @Test
    void digestsAreSixtyFourHexadecimalDigits() {
        assertRefused(
                () -> new SourceFile("standing", "s.c3d", "abc"),
                "SHA-256 'abc', expected 64 lower-case hexadecimal digits");
        assertThat(new SourceFile("standing", "s.c3d", "0f".repeat(32)).role()).isEqualTo("standing");
    }
}
