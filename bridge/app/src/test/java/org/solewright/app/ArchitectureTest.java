package org.solewright.app;

import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaMethod;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.domain.JavaParameter;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.util.stream.Stream;
import org.jspecify.annotations.NullMarked;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** The arrows and habits that the tree promises; each rule stands for one of them. */
class ArchitectureTest {

    private static final String ROOT = "org.solewright.";
    private static final String[] GENERATED = {
        ROOT + "formats.footmodel.landmarksxml..",
        ROOT + "formats.footmodel.planxml..",
        ROOT + "formats.footmodel.resultsxml..",
        ROOT + "formats.footmodel.studyxml..",
        ROOT + "formats.footmodel.footxml..",
        ROOT + "formats.footmodel.rolloverxml..",
        ROOT + "formats.footmodel.costxml..",
        ROOT + "app.report.pages.."
    };

    private static final JavaClasses ALL = new ClassFileImporter()
            .withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages("org.solewright");

    private static final JavaClasses OWN = ALL.that(DescribedPredicate.not(resideInAnyPackage(GENERATED)));

    private static String[] packages(String... names) {
        return Stream.of(names).map(n -> ROOT + n + "..").toArray(String[]::new);
    }

    @Test
    void rulesSeeTheWholeTree() {
        // A rule over classes that were not found would hold for nothing.
        for (String layer : packages("domain", "formats", "analysis", "app")) {
            org.assertj.core.api.Assertions.assertThat(ALL.that(resideInAPackage(layer)))
                    .as(layer)
                    .hasSizeGreaterThan(10);
        }
    }

    @TestFactory
    Stream<DynamicTest> promises() {
        return Stream.of(
                rule(
                        "the domain rests on the JDK alone",
                        classes()
                                .that()
                                .resideInAPackage(ROOT + "domain..")
                                .should()
                                .onlyDependOnClassesThat()
                                .resideInAnyPackage("java..", "org.jspecify..", ROOT + "domain..")),
                rule(
                        "mathematics knows no files, formats or use cases",
                        noClasses()
                                .that()
                                .resideInAPackage(ROOT + "analysis..")
                                .should()
                                .dependOnClassesThat()
                                .resideInAnyPackage(
                                        "java.io..", "java.nio..", "javax.xml..", ROOT + "formats..", ROOT + "app..")),
                rule(
                        "numerics are below gait, fitting and dynamics",
                        noClasses()
                                .that()
                                .resideInAPackage(ROOT + "analysis.numerics..")
                                .should()
                                .dependOnClassesThat()
                                .resideInAnyPackage(packages(
                                        "analysis.gait", "analysis.fitting", "analysis.dynamics", "analysis.cost"))),
                rule(
                        "gait, fitting and dynamics are below cost",
                        noClasses()
                                .that()
                                .resideInAnyPackage(packages("analysis.gait", "analysis.fitting", "analysis.dynamics"))
                                .should()
                                .dependOnClassesThat()
                                .resideInAPackage(ROOT + "analysis.cost..")),
                rule(
                        "one format does not see another",
                        slices().matching(ROOT + "formats.(*)..")
                                .should()
                                .notDependOnEachOther()
                                .ignoreDependency(
                                        DescribedPredicate.alwaysTrue(), resideInAPackage(ROOT + "formats.io.."))),
                rule(
                        "converters know nothing of the bridge",
                        noClasses()
                                .that()
                                .resideInAnyPackage(packages("domain", "formats"))
                                .should()
                                .dependOnClassesThat()
                                .resideInAnyPackage(packages("analysis", "app"))),
                rule(
                        "no package cycles",
                        slices().matching("org.solewright.(**)").should().beFreeOfCycles()),
                rule(
                        "XML binding stays inside formats",
                        noClasses()
                                .that()
                                .resideOutsideOfPackage(ROOT + "formats.footmodel..")
                                .should()
                                .dependOnClassesThat()
                                .resideInAnyPackage("jakarta.xml.bind..")),
                rule(
                        "no XML binding type in a public signature",
                        classes()
                                .that()
                                .resideInAPackage(ROOT + "formats..")
                                .and()
                                .arePublic()
                                .should(haveNoPublicSignatureFrom("jakarta.xml.bind", "xml.Xml"))),
                rule(
                        "only the command line prints",
                        noClasses()
                                .that()
                                .resideOutsideOfPackage(ROOT + "app.cli..")
                                .should()
                                .accessField(System.class, "out")
                                .orShould()
                                .accessField(System.class, "err")),
                rule(
                        "only the entry ends the process",
                        noClasses()
                                .that()
                                .doNotHaveFullyQualifiedName(ROOT + "app.cli.Main")
                                .should()
                                .callMethod(System.class, "exit", int.class)),
                rule(
                        // Their order differs from process to process, and with it the last digit of a sum.
                        "copies of maps and sets keep their order",
                        noClasses()
                                .that()
                                .resideOutsideOfPackage(ROOT + "formats..")
                                .should()
                                .callMethod(java.util.Map.class, "copyOf", java.util.Map.class)
                                .orShould()
                                .callMethod(java.util.Set.class, "copyOf", java.util.Collection.class)),
                rule("records hold no arrays", classes().that().areRecords().should(haveNoArrayField())),
                rule(
                        "static fields do not change",
                        fields().that().areStatic().should().beFinal()),
                rule(
                        "no class is a drawer",
                        noClasses()
                                .should()
                                .haveSimpleNameEndingWith("Util")
                                .orShould()
                                .haveSimpleNameEndingWith("Utils")
                                .orShould()
                                .haveSimpleNameEndingWith("Helper")
                                .orShould()
                                .haveSimpleNameEndingWith("Manager")),
                rule("packages are null-marked", classes().should(beInANullMarkedPackage())),
                rule(
                        "classes are final unless made to be extended",
                        classes()
                                .that()
                                .areNotInterfaces()
                                .and()
                                .areNotEnums()
                                .and()
                                .doNotHaveSimpleName("package-info")
                                .and()
                                .areNotAnonymousClasses()
                                .should()
                                .haveModifier(JavaModifier.FINAL)
                                .orShould()
                                .haveModifier(JavaModifier.ABSTRACT)));
    }

    private static DynamicTest rule(String promise, ArchRule rule) {
        return DynamicTest.dynamicTest(promise, () -> rule.check(OWN));
    }

    private static ArchCondition<JavaClass> haveNoPublicSignatureFrom(String... packages) {
        return new ArchCondition<>("have no public signature with an XML binding type") {
            @Override
            public void check(JavaClass type, ConditionEvents events) {
                for (JavaMethod method : type.getMethods()) {
                    boolean isSeen = method.getModifiers().contains(JavaModifier.PUBLIC)
                            && (isOneOf(method.getRawReturnType(), packages)
                                    || method.getParameters().stream()
                                            .map(JavaParameter::getRawType)
                                            .anyMatch(t -> isOneOf(t, packages)));
                    if (isSeen) {
                        events.add(SimpleConditionEvent.violated(method, method.getFullName()));
                    }
                }
            }
        };
    }

    private static boolean isOneOf(JavaClass type, String... parts) {
        return Stream.of(parts).anyMatch(type.getFullName()::contains);
    }

    private static ArchCondition<JavaClass> haveNoArrayField() {
        return new ArchCondition<>("have no array component") {
            @Override
            public void check(JavaClass type, ConditionEvents events) {
                type.getFields().stream()
                        .filter(f -> !f.getModifiers().contains(JavaModifier.STATIC))
                        .filter(f -> f.getRawType().isArray())
                        .forEach(f -> events.add(SimpleConditionEvent.violated(f, f.getFullName())));
            }
        };
    }

    private static ArchCondition<JavaClass> beInANullMarkedPackage() {
        return new ArchCondition<>("be in a null-marked package") {
            @Override
            public void check(JavaClass type, ConditionEvents events) {
                if (!type.getPackage().isAnnotatedWith(NullMarked.class)) {
                    events.add(SimpleConditionEvent.violated(type, type.getFullName() + " is not null-marked"));
                }
            }
        };
    }
}
