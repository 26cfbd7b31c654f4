package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FittedNumber;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.Subject;

/** A model whose numbers carry the SD of {@link FitUncertainty}, and the table of them. */
final class UncertainModel {

    private static final double DEGREES = Math.toDegrees(1);

    /** A direction has two degrees of freedom, a place three. */
    private static final double OF_DIRECTION = 2;

    private static final double OF_PLACE = 3;

    private final FootModel model;
    private final FitUncertainty known;

    UncertainModel(FootModel model, FitUncertainty known) {
        this.model = model;
        this.known = known;
    }

    /** The model with every SD that is known; the others stay as they were. */
    FootModel model() {
        Subject s = model.subject();
        return new FootModel(
                model.side(),
                model.version(),
                new Subject(
                        s.id(),
                        s.mass(),
                        s.stature(),
                        standing(s.limbLength(), "limb_length"),
                        s.footLength().map(q -> standing(q, "foot_length")),
                        s.effectiveFootLength().map(q -> rolled(q, "effective_foot_length")),
                        s.population(),
                        s.sex()),
                model.sources(),
                model.segments().stream().map(this::segment).toList(),
                model.joints().stream().map(this::joint).toList(),
                model.landmarks(),
                new Rolling(
                        model.rolling().arcs().stream().map(this::arc).toList(),
                        model.rolling().outline(),
                        model.rolling().pivots(),
                        model.rolling().cap()),
                model.pads(),
                model.findings(),
                model.cautions());
    }

    private Quantity standing(Quantity q, String name) {
        return sd(q, known.measurementSd(name));
    }

    private Quantity rolled(Quantity q, String name) {
        return sd(
                q,
                known.number(name, "m", 1, q.basis(), q.value())
                        .map(FittedNumber::sd)
                        .orElse(OptionalDouble.empty()));
    }

    private static Quantity sd(Quantity q, OptionalDouble sd) {
        return sd.isPresent() ? new Quantity(q.value(), q.basis(), sd) : q;
    }

    private Segment segment(Segment s) {
        return new Segment(
                s.name(),
                s.parent(),
                s.mass(),
                s.centreOfMass(),
                s.inertia(),
                s.inertiaBasis(),
                standing(s.length(), "segment." + s.name().word() + ".length"),
                s.observed());
    }

    private Joint joint(Joint j) {
        OptionalDouble centre = known.componentSd("joint." + j.name() + ".centre", OF_PLACE);
        return new Joint(
                j.name(),
                j.proximal(),
                j.distal(),
                j.kind(),
                centre.isPresent()
                        ? new Located(j.centre().position(), j.centre().basis(), centre)
                        : j.centre(),
                j.axes().stream().map(this::axis).toList(),
                j.range(),
                j.lock());
    }

    /** A published axis keeps its published spread: placement of landmarks does not move it. */
    private Joint.Axis axis(Joint.Axis a) {
        OptionalDouble sd = known.componentSd("axis." + a.name(), OF_DIRECTION);
        return a.basis() == Basis.MEASURED && a.source() != Joint.Axis.Source.MOTION && sd.isPresent()
                ? new Joint.Axis(a.name(), a.direction(), a.basis(), sd, a.source())
                : a;
    }

    private Rolling.Arc arc(Rolling.Arc a) {
        OptionalDouble sd = known.number(
                        "arc." + a.frame().word() + ".curvature", "1/m", 1, Basis.MEASURED, a.curvature())
                .map(FittedNumber::sd)
                .orElse(OptionalDouble.empty());
        if (sd.isEmpty()) {
            return a;
        }
        return new Rolling.Arc(
                a.frame(),
                a.curvature(),
                sd,
                a.curvature() == 0
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(sd.getAsDouble() / (a.curvature() * a.curvature())),
                a.centreX(),
                a.centreY(),
                a.arcLength(),
                a.rms(),
                a.steps());
    }

    /** Rows of the table of uncertainties. */
    List<FittedNumber> rows() {
        List<FittedNumber> rows = new ArrayList<>();
        Subject s = model.subject();
        add(rows, "limb_length", "m", 1, s.limbLength().basis(), s.limbLength().value());
        s.footLength().ifPresent(q -> add(rows, "foot_length", "m", 1, q.basis(), q.value()));
        s.effectiveFootLength().ifPresent(q -> add(rows, "effective_foot_length", "m", 1, q.basis(), q.value()));
        for (Segment g : model.segments()) {
            add(
                    rows,
                    "segment." + g.name().word() + ".length",
                    "m",
                    1,
                    g.length().basis(),
                    g.length().value());
        }
        for (Joint j : model.joints()) {
            String centre = "joint." + j.name() + ".centre";
            Located at = j.centre();
            add(rows, centre + "_x", "m", 1, at.basis(), at.position().x());
            add(rows, centre + "_y", "m", 1, at.basis(), at.position().y());
            add(rows, centre + "_z", "m", 1, at.basis(), at.position().z());
            for (Joint.Axis a : j.axes()) {
                if (a.basis() == Basis.MEASURED) {
                    add(
                            rows,
                            "axis." + a.name() + "_x",
                            "1",
                            1,
                            a.basis(),
                            a.direction().x());
                    add(
                            rows,
                            "axis." + a.name() + "_y",
                            "1",
                            1,
                            a.basis(),
                            a.direction().y());
                    add(
                            rows,
                            "axis." + a.name() + "_z",
                            "1",
                            1,
                            a.basis(),
                            a.direction().z());
                }
            }
        }
        for (Rolling.Arc a : model.rolling().arcs()) {
            String name = "arc." + a.frame().word() + ".";
            add(rows, name + "curvature", "1/m", 1, Basis.MEASURED, a.curvature());
            add(rows, name + "centre_x", "m", 1, Basis.MEASURED, a.centreX().orElse(Double.NaN));
            add(rows, name + "centre_y", "m", 1, Basis.MEASURED, a.centreY().orElse(Double.NaN));
            add(rows, name + "length", "m", 1, Basis.MEASURED, a.arcLength());
        }
        for (String name : known.names()) {
            if (name.startsWith("angle.")) {
                add(rows, name, "deg", DEGREES, Basis.MEASURED, Double.NaN);
            }
        }
        return rows;
    }

    private void add(List<FittedNumber> rows, String name, String unit, double factor, Basis basis, double value) {
        known.number(name, unit, factor, basis, value).ifPresent(rows::add);
    }
}
