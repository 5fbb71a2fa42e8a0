package nearworld;

import static com.tngtech.archunit.base.DescribedPredicate.describe;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.Architectures.layeredArchitecture;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaCall;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;
import jakarta.persistence.Entity;
import java.util.Set;
import nearworld.app.NearworldApplication;
import org.junit.jupiter.api.Test;
import org.springframework.data.repository.Repository;
import org.springframework.modulith.core.ApplicationModules;
import org.springframework.stereotype.Controller;

/** Who may use whom: engine, then exchange, then the application and the command line; features beside each other. */
@AnalyzeClasses(packages = "nearworld", importOptions = ImportOption.DoNotIncludeTests.class)
class BoundariesTest {
    /** These may differ in the last bit from machine to machine; {@link StrictMath} does not. */
    private static final Set<String> INEXACT = Set.of(
            "exp", "expm1", "log", "log10", "log1p", "pow", "cbrt", "hypot", "sin", "cos", "tan", "asin", "acos",
            "atan", "atan2", "sinh", "cosh", "tanh");

    @ArchTest
    static final ArchRule engineUsesTheJdkOnly = classes()
            .that()
            .resideInAPackage("nearworld.engine..")
            .should()
            .onlyDependOnClassesThat()
            .resideInAnyPackage(
                    "nearworld.engine..",
                    "java.lang..",
                    "java.math..",
                    "java.text..",
                    "java.time..",
                    "java.util..",
                    "org.jspecify.annotations..");

    @ArchTest
    static final ArchRule engineHasNoLoggerAndNoClock = noClasses()
            .that()
            .resideInAPackage("nearworld.engine..")
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage("java.util.logging..")
            .orShould()
            .callMethodWhere(named("the time of now is asked for", Set.of("now", "currentTimeMillis", "nanoTime")));

    @ArchTest
    static final ArchRule engineGivesTheSameBytesOnEveryMachine = noClasses()
            .that()
            .resideInAPackage("nearworld.engine..")
            .should()
            .callMethodWhere(describe(
                    "java.lang.Math is asked for a function that may differ between machines",
                    call -> call.getTargetOwner().isEquivalentTo(Math.class)
                            && INEXACT.contains(call.getTarget().getName())));

    @ArchTest
    static final ArchRule engineLayers = layeredArchitecture()
            .consideringOnlyDependenciesInAnyPackage("nearworld.engine..")
            .layer("basics")
            .definedBy("nearworld.engine.basics..")
            .layer("mortality")
            .definedBy("nearworld.engine.mortality..")
            .layer("network")
            .definedBy("nearworld.engine.network..")
            .layer("inference")
            .definedBy("nearworld.engine.inference..")
            .layer("counterfactual")
            .definedBy("nearworld.engine.counterfactual..")
            .layer("assessment")
            .definedBy("nearworld.engine.assessment..")
            .withOptionalLayers(true)
            .whereLayer("basics")
            .mayNotAccessAnyLayer()
            .whereLayer("mortality")
            .mayOnlyAccessLayers("basics")
            .whereLayer("network")
            .mayOnlyAccessLayers("basics")
            .whereLayer("inference")
            .mayOnlyAccessLayers("basics", "mortality", "network")
            .whereLayer("counterfactual")
            .mayOnlyAccessLayers("basics", "mortality", "network", "inference");

    @ArchTest
    static final ArchRule exchangeKnowsNeitherSpringNorTheApplication = noClasses()
            .that()
            .resideInAPackage("nearworld.exchange..")
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage("org.springframework..", "jakarta..", "nearworld.app..", "nearworld.cli..");

    @ArchTest
    static final ArchRule commandLineKnowsNeitherSpringNorTheApplication = noClasses()
            .that()
            .resideInAPackage("nearworld.cli..")
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage("org.springframework..", "jakarta..", "nearworld.app..");

    @ArchTest
    static final ArchRule packagesAreFreeOfCycles =
            slices().matching("nearworld.(**)").should().beFreeOfCycles();

    @ArchTest
    static final ArchRule entitiesStayInTheirFeature =
            classes().that().areAnnotatedWith(Entity.class).should().bePackagePrivate();

    @ArchTest
    static final ArchRule repositoriesStayInTheirFeature =
            classes().that().areAssignableTo(Repository.class).should().bePackagePrivate();

    @ArchTest
    static final ArchRule controllersStayInTheirFeature =
            classes().that().areMetaAnnotatedWith(Controller.class).should().bePackagePrivate();

    @Test
    void featuresUseOnlyWhatOthersOffer() {
        ApplicationModules.of(NearworldApplication.class).verify();
    }

    private static DescribedPredicate<JavaCall<?>> named(String description, Set<String> methods) {
        return describe(
                description,
                call -> call.getTargetOwner().getPackageName().matches("java\\.(lang|time).*")
                        && methods.contains(call.getTarget().getName()));
    }
}
