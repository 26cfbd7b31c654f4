package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import org.jspecify.annotations.Nullable;
import org.solewright.analysis.cost.ComparedPostures;
import org.solewright.analysis.cost.DistalWork;
import org.solewright.analysis.cost.PowerWork;
import org.solewright.analysis.cost.StepMechanics;
import org.solewright.analysis.fitting.FittedArc;
import org.solewright.analysis.fitting.RollOver;
import org.solewright.analysis.fitting.RollOverPath;
import org.solewright.analysis.gait.LandmarkTracks;
import org.solewright.analysis.gait.Pass;
import org.solewright.analysis.gait.Step;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.CurveRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Stance;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Vec3;

/** Columns of one transition that need the model of its trailing limb. */
final class ModelColumns {

    private final Pass pass;
    private final LandmarkTracks tracks;
    private final Step step;
    private final double markerCutoff;
    private final List<PostureRow> postures = new ArrayList<>();
    private final List<CurveRow> curves = new ArrayList<>();
    private final List<Finding> findings = new ArrayList<>();
    private final List<Finding> unlisted = new ArrayList<>();

    ModelColumns(Pass pass, LandmarkTracks tracks, Step step, double markerCutoff) {
        this.pass = pass;
        this.tracks = tracks;
        this.step = step;
        this.markerCutoff = markerCutoff;
    }

    /** Rows of postures.csv. */
    List<PostureRow> postures() {
        return postures;
    }

    /** Moments and powers of the trailing limb's joints over its stance. */
    List<CurveRow> curves() {
        return curves;
    }

    /** Findings whose codes stand in the row. */
    List<Finding> findings() {
        return findings;
    }

    /** Findings of the whole call. */
    List<Finding> unlisted() {
        return unlisted;
    }

    /** Fills the columns of one row, with the trailing limb's model. */
    void fill(TransitionRow.Builder row, ModelLimb limb, StepMechanics m) {
        var subject = limb.model().subject();
        double l = subject.limbLength().value();
        row.number("limb_length_m", l);
        subject.limbLength().sd().ifPresent(sd -> row.number("limb_length_m_sd", sd));
        subject.footLength().ifPresent(q -> {
            row.number("foot_length_m", q.value());
            q.sd().ifPresent(sd -> row.number("foot_length_m_sd", sd));
        });
        subject.effectiveFootLength().ifPresent(q -> {
            row.number("effective_foot_length_m", q.value());
            q.sd().ifPresent(sd -> row.number("effective_foot_length_m_sd", sd));
        });
        rollingRadius(row, limb);
        distalWork(row, limb);
        hindfootWork(row, limb);
        jointLoads(row, limb);
        Double length = m.values().get(Measure.STEP_LENGTH);
        Double before = m.values().get(Measure.SPEED_BEFORE);
        Double mass = m.values().get(Measure.MASS);
        Double speed = m.values().get(Measure.SPEED);
        double gravity = step.loads().gravity();
        if (length != null && before != null && mass != null && length > 0 && before > 0 && mass > 0) {
            ComparedPostures compared = ComparedPostures.of(
                    limb.compared(),
                    new ComparedPostures.TakenStep(
                            pass.trial().name(), Integer.toString(step.number()), length, before, mass, gravity));
            compared.fill(row);
            postures.addAll(compared.rows());
            compared.findings().forEach(f -> findings.add(f));
            if (subject.population() != Population.OTHER) {
                unlisted.add(Finding.note(
                        "postures.thought-experiment",
                        "digitigrade, unguligrade",
                        ComparedPostures.THOUGHT_EXPERIMENT));
            }
            row.number("step_length_nd", length / l);
            scaled(row, "push_off_nd", m.values().get(Measure.PUSH_OFF), mass * gravity * l);
            scaled(row, "collision_nd", m.values().get(Measure.COLLISION), mass * gravity * l);
        }
        scaled(row, "speed_nd", speed, Math.sqrt(gravity * l));
    }

    private static void scaled(TransitionRow.Builder row, String column, @Nullable Double value, double by) {
        if (value != null) {
            row.number(column, value / by);
        }
    }

    /** Work distal to the shank of the trailing limb over its stance. */
    private void distalWork(TransitionRow.Builder row, ModelLimb limb) {
        Stance trailing = step.loads().trailing();
        Optional<PowerWork> work = platform()
                .flatMap(p ->
                        distal(f -> limb.shankPose(tracks, f)).over(p, markerCutoff, trailing.start(), trailing.end()));
        if (work.isEmpty()) {
            findings.add(Finding.note(
                    "distal.unknown",
                    pass.trial().name() + " step " + step.number(),
                    "no work distal to the shank: "
                            + (!trailing.whole()
                                    ? trailing.why()
                                    : "the shank is not tracked throughout the stance on one platform")));
            return;
        }
        row.number("ankle_foot_work_pos_J", work.get().positive());
        row.number("ankle_foot_work_neg_J", work.get().negative());
    }

    /** Work distal to the hindfoot of the trailing limb over its stance; only where the hindfoot itself was tracked. */
    private void hindfootWork(TransitionRow.Builder row, ModelLimb limb) {
        Stance trailing = step.loads().trailing();
        Optional<ModelChain> chain = limb.chain(tracks).filter(c -> c.isObserved(SegmentName.HINDFOOT));
        Optional<PowerWork> work = chain.flatMap(c -> platform()
                .flatMap(p -> distal(f -> c.pose(SegmentName.HINDFOOT, f))
                        .over(p, markerCutoff, trailing.start(), trailing.end())));
        work.ifPresent(w -> {
            row.number("foot_work_pos_J", w.positive());
            row.number("foot_work_neg_J", w.negative());
        });
        if (work.isEmpty()) {
            unlisted.add(Finding.note(
                    "distal.hindfoot-unknown",
                    pass.trial().name(),
                    "foot_work_* are empty where the model has no hindfoot, or not three of its points were tracked"
                            + " over a whole stance on one platform"));
        }
    }

    private DistalWork distal(IntFunction<Optional<Pose>> pose) {
        Vec3 belt = pass.R_LW().x().times(-pass.trial().beltSpeed());
        return new DistalWork(pose, pass.trial().rate(), pass.trial().startTime(), belt);
    }

    /** The one platform that bore the whole trailing stance. */
    private Optional<PlatformLoads> platform() {
        Stance trailing = step.loads().trailing();
        return pass.trial().platforms().stream()
                .filter(p -> trailing.whole() && trailing.platforms().equals(List.of(p.number())))
                .findFirst();
    }

    private void jointLoads(TransitionRow.Builder row, ModelLimb limb) {
        JointDynamics.of(limb.chain(tracks), pass, step.loads().trailing(), markerCutoff)
                .ifPresent(j -> {
                    j.ankleWork().ifPresent(w -> {
                        row.number("ankle_work_pos_J", w.positive());
                        row.number("ankle_work_neg_J", w.negative());
                    });
                    curves.addAll(j.curves(Integer.toString(step.number())));
                    findings.addAll(j.findings());
                });
    }

    private void rollingRadius(TransitionRow.Builder row, ModelLimb limb) {
        Stance trailing = step.loads().trailing();
        String where = pass.trial().name() + " step " + step.number();
        boolean hasShank = limb.hasShank(tracks);
        if (!trailing.allows(Use.ROLL_OVER) || !hasShank) {
            findings.add(Finding.note(
                    "rolling.stance-unused",
                    where,
                    !hasShank
                            ? "the points of the model's shank are not tracked: no rolling radius"
                            : "no rolling radius: " + trailing.why()));
            return;
        }
        double weight = limb.model().subject().mass().value() * step.loads().gravity();
        Optional<RollOverPath> path = RollOverShapes.of(
                        pass,
                        trailing,
                        f -> limb.ankle(tracks, f),
                        f -> limb.knee(tracks, f),
                        RollOverShapes.leastLoad(weight, limb.model().subject().population() != Population.OTHER))
                .filter(RollOver::isLongEnough);
        if (path.isEmpty()) {
            findings.add(Finding.note(
                    "rolling.stance-unused", where, "the roll-over of the trailing stance has too few samples"));
            return;
        }
        FittedArc arc = RollOver.arc(path.get());
        if (!(arc.curvature() > 0)) {
            findings.add(
                    Finding.note("rolling.flat", where, "the roll-over shape is flat or hollow: no rolling radius"));
            return;
        }
        row.number("rolling_radius_m", 1 / arc.curvature());
        RollOver.blockSd(arc, path.get().rate())
                .ifPresent(sd -> row.number("rolling_radius_m_sd", sd / (arc.curvature() * arc.curvature())));
    }
}
