package org.solewright.app.report;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import org.solewright.domain.cost.Comparison;
import org.solewright.domain.cost.Measure;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.cost.WorkForm;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.gait.ContactRow;

/** The page of an appraisal: what each step did, what it cost, and what other postures of the limb would have cost. */
public final class PostureCostPage {

    /** Steps that are drawn one by one; all stand in the table. */
    private static final int MOST_DRAWN = 6;

    /**
     * What the page is made from.
     *
     * @param cost rows, findings, provenance
     * @param transitions in the order of the rows
     * @param postures what other postures would have cost
     * @param contacts of the feet with the platforms
     * @param models whose limbs these are
     * @param isMeasured whether recordings of a person or animal were appraised, not results of a simulation
     */
    public record Content(
            PostureCost cost,
            List<TransitionView> transitions,
            List<PostureRow> postures,
            List<ContactRow> contacts,
            List<FootModel> models,
            boolean isMeasured) {

        /** Copies the lists. */
        public Content {
            transitions = List.copyOf(transitions);
            postures = List.copyOf(postures);
            contacts = List.copyOf(contacts);
            models = List.copyOf(models);
        }
    }

    private final Content content;
    private final List<TransitionRow> rows = new ArrayList<>();

    private PostureCostPage(Content content) {
        this.content = content;
        for (TransitionRow row : content.cost().rows()) {
            if (!row.text("trial").orElse("").equals("*")) {
                rows.add(row);
            }
        }
    }

    /**
     * The page.
     *
     * @param content what it is made from
     * @param cures what to do about a finding, by its code
     * @return ready to be set
     */
    public static Page of(Content content, Function<String, Optional<String>> cures) {
        return new PostureCostPage(content).page(cures);
    }

    private Page page(Function<String, Optional<String>> cures) {
        Set<Finding> findings = new LinkedHashSet<>(content.cost().findings());
        content.models().forEach(m -> findings.addAll(m.findings()));
        List<Finding> all = List.copyOf(findings);
        List<Section> sections = new ArrayList<>();
        sections.add(steps());
        sections.add(new Section(
                "work",
                "Work of the steps",
                List.of(Block.Figures.of(WorkFigure.of(content.cost().rows(), "work-figure"))),
                false));
        postures().ifPresent(sections::add);
        sections.add(audit());
        sections.add(new Section(
                "table", "Step table", List.of(StepTable.of(content.cost().rows())), false));
        sections.add(Provenance.section(
                content.cost().sources(),
                content.cost().settings(),
                content.cost().version()));
        return new Page(
                "Posture cost",
                subject().isEmpty() ? "What these steps cost" : "What the steps of " + subject() + " cost",
                "Mechanical work of the step-to-step transition, measured, beside what other postures of the same limb"
                        + " would have cost by geometry.",
                facts(),
                quality(all),
                FindingGroup.of(all, cures),
                sections,
                false,
                content.cost().cautions());
    }

    private String subject() {
        return content.models().stream()
                .map(m -> m.subject().id())
                .filter(id -> !id.isBlank())
                .findFirst()
                .orElse("");
    }

    private List<Page.Fact> facts() {
        List<Page.Fact> facts = new ArrayList<>();
        facts.add(new Page.Fact("Subject", subject().isEmpty() ? "no identifier was given" : subject()));
        facts.add(new Page.Fact(
                content.isMeasured() ? "Recordings" : "Results",
                Words.list(content.cost().sources().stream()
                        .filter(s -> !s.role().equals("landmarks") && !s.role().equals("model"))
                        .map(s -> fileName(s.path()))
                        .toList())));
        facts.add(new Page.Fact("Steps", Integer.toString(rows.size())));
        facts.add(new Page.Fact("Body mass", mass()));
        facts.add(new Page.Fact("Written by", "Solewright " + content.cost().version()));
        return facts;
    }

    static String fileName(String path) {
        return path.substring(Math.max(path.lastIndexOf('/'), path.lastIndexOf('\\')) + 1);
    }

    private String mass() {
        Optional<String> given = content.cost().settings().stream()
                .filter(s -> s.name().equals("mass_kg"))
                .map(PostureCost.Setting::value)
                .findFirst();
        if (given.isPresent()) {
            return Words.number(Double.parseDouble(given.get()), 1) + " kg, given";
        }
        double[] carried = rows.stream()
                .flatMap(r -> r.number("mass_kg").stream().boxed())
                .mapToDouble(x -> x)
                .toArray();
        if (carried.length == 0) {
            return "not known";
        }
        double mean = 0;
        for (double m : carried) {
            mean += m / carried.length;
        }
        return Words.number(mean, 1) + " kg, the mean load of the steps; no mass was given";
    }

    private Quality quality(List<Finding> findings) {
        QualityReview review = new QualityReview()
                .findings(findings)
                .contacts(content.contacts())
                .mass(mass());
        int n = rows.size();
        use(review, "Push-off work of the trailing limb", "push_off_J", n);
        use(review, "Collision work of the leading limb", "collision_J", n);
        use(review, "Rebound and preload of the leading limb", "preload_J", n);
        use(review, "Rolling radius of the trailing foot", "rolling_radius_m", n);
        use(review, "Comparison with other postures", "compass_J", n);
        use(review, "Work distal to the shank", "ankle_foot_work_pos_J", n);
        review.use(new Quality.Usable(
                "Metabolic energy, diagnosis, treatment", "no", "works are mechanical, and this is no medical device"));
        return review.quality();
    }

    private void use(QualityReview review, String question, String column, int n) {
        List<String> missing = new ArrayList<>();
        for (TransitionRow row : rows) {
            if (row.number(column).isEmpty()) {
                missing.add(row.text("trial").orElse("") + " step "
                        + row.text("step").orElse(""));
            }
        }
        int there = n - missing.size();
        review.use(Quality.Usable.of(
                question,
                there,
                n,
                there + " of " + n + (n == 1 ? " step" : " steps")
                        + (missing.isEmpty() ? "" : "; not " + Words.list(missing))));
    }

    private Section steps() {
        List<Block> blocks = new ArrayList<>();
        int drawn = 0;
        for (TransitionView view : content.transitions()) {
            if (drawn == MOST_DRAWN) {
                blocks.add(new Block.Text("Further steps are not drawn; all stand in the step table."));
                break;
            }
            drawn++;
            blocks.add(new Block.Heading(view.name() + ": from the "
                    + view.trailing().word() + " to the " + view.leading().word() + " limb"));
            blocks.add(Block.Figures.beside(
                    HodographFigure.of(view, "hodograph-" + drawn), PowerFigure.of(view, "power-" + drawn)));
        }
        return new Section("steps", "What each step did", blocks, false);
    }

    /** The step whose landscape is drawn: per trailing side the one that knows most of its works. */
    private List<TransitionRow> drawn() {
        List<TransitionRow> best = new ArrayList<>();
        for (String side : List.of("right", "left")) {
            rows.stream()
                    .filter(r -> r.text("trailing_side").orElse("").equals(side)
                            && r.number("compass_J").isPresent())
                    .max((a, b) -> Integer.compare(known(a), known(b)))
                    .ifPresent(best::add);
        }
        return best;
    }

    private static int known(TransitionRow row) {
        int n = 0;
        for (Measure m : Measure.values()) {
            n += row.number(m.column()).isPresent() ? 1 : 0;
        }
        return n;
    }

    private boolean isOf(PostureRow posture, TransitionRow row) {
        return posture.trial().equals(row.text("trial").orElse(""))
                && posture.step().equals(row.text("step").orElse(""));
    }

    private Optional<Section> postures() {
        List<Block> blocks = new ArrayList<>();
        int number = 0;
        for (TransitionRow row : drawn()) {
            number++;
            List<PostureCurve> curves = new ArrayList<>();
            List<PostureRow> measured = new ArrayList<>();
            for (PostureRow p : content.postures()) {
                if (!isOf(p, row) || p.comparison() != Comparison.MEASURED) {
                    continue;
                }
                measured.add(p);
                boolean isFlat = p.posture().kind() == Posture.Kind.COMPASS
                        || p.posture().kind() == Posture.Kind.PLANTIGRADE;
                if (p.workForm() == WorkForm.SIMULTANEOUS && isFlat) {
                    curves.add(PostureCurve.of(p, row.number("mass_kg").orElse(0)));
                }
            }
            if (curves.isEmpty()) {
                continue;
            }
            blocks.add(new Block.Heading("The " + row.text("trailing_side").orElse("") + " limb, "
                    + row.text("trial").orElse("") + " step " + row.text("step").orElse("")));
            blocks.add(Block.Figures.of(LandscapeFigure.of(row, curves, "landscape-" + number)));
            blocks.add(Block.Figures.of(EqualWorkFigure.of(row, curves, "equal-work-" + number)));
            blocks.add(PostureTable.of(row, measured));
        }
        if (blocks.isEmpty()) {
            return Optional.empty();
        }
        blocks.add(new Block.Text(
                "Heel raised, and tip of the toe: a geometric thought experiment; muscle work to hold the"
                        + " heel up is not counted. Push-off alone and push-off with collision at once bracket each other; neither"
                        + " is the comparable one."));
        return Optional.of(new Section("postures", "Beside other postures of the same limb", blocks, false));
    }

    private Section audit() {
        List<Block.Row> audited = new ArrayList<>();
        for (TransitionRow row : rows) {
            if (row.number("audit_force_residual_bw").isPresent()
                    || row.number("audit_energy_residual").isPresent()) {
                audited.add(Block.Row.of(
                        row.text("trial").orElse("") + " step "
                                + row.text("step").orElse(""),
                        Words.number(row.number("audit_force_residual_bw"), 4),
                        Words.number(row.number("audit_energy_residual"), 4)));
            }
        }
        List<Block> blocks = audited.isEmpty()
                ? List.of(new Block.Text(
                        content.isMeasured()
                                ? "Measured recordings are not audited: there is no second account of the same forces in"
                                        + " them."
                                : "The results state too little for an audit of forces and energy."))
                : List.of(new Block.Table(
                        "Audit of forces and energy",
                        List.of("Step", "Force residual (body weights)", "Energy residual (share of the work)"),
                        audited,
                        true));
        return new Section("audit", "Audit", blocks, false);
    }
}
