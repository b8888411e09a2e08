package dev.couplet.bench.architecture;

import static com.tngtech.archunit.core.domain.JavaCall.Predicates.target;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.assignableTo;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideOutsideOfPackage;
import static com.tngtech.archunit.core.domain.properties.HasName.Predicates.name;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.domain.JavaPackage;
import com.tngtech.archunit.lang.ArchRule;
import java.io.Serializable;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.concurrent.ThreadLocalRandom;
import org.jspecify.annotations.NullMarked;

/**
 * The rules that every class keeps. Each lists what breaks it, in words.
 *
 * @param root the package that the rooms stand in
 */
record Rules(String root) {
  /** Rooms import only the rooms to which their arrows lead. */
  List<String> arrows(JavaClasses all) {
    List<String> broken = new ArrayList<>();
    Rooms.reachable()
        .forEach(
            (room, allowed) ->
                broken.addAll(
                    check(
                        all,
                        classes()
                            .that()
                            .resideInAPackage(in(room))
                            .should()
                            .onlyDependOnClassesThat(
                                resideOutsideOfPackage(root + "..")
                                    .or(resideInAnyPackage(in(allowed))))
                            .allowEmptyShould(true))));
    return broken;
  }

  /** Every class stands in a room that the design knows. */
  List<String> knownRooms(JavaClasses all) {
    return check(all, classes().should().resideInAnyPackage(in(Rooms.reachable().keySet())));
  }

  /** No package depends on itself by way of others. */
  List<String> packageCycles(JavaClasses all) {
    return check(all, slices().matching(root + ".(**)").should().beFreeOfCycles());
  }

  /** The rooms of api need the platform and the annotations for null, no more. */
  List<String> apiAlone(JavaClasses all) {
    return check(
        all,
        classes()
            .that()
            .resideInAnyPackage(in(Rooms.API))
            .should()
            .onlyDependOnClassesThat()
            .resideInAnyPackage("java..", "org.jspecify..", root + "..")
            .allowEmptyShould(true));
  }

  /** Only programs print. */
  List<String> printing(JavaClasses all) {
    return check(
        all,
        noClasses()
            .that()
            .resideOutsideOfPackage(root + ".bench..")
            .should()
            .accessField(System.class, "out")
            .orShould()
            .accessField(System.class, "err")
            .orShould()
            .callMethodWhere(target(name("printStackTrace"))));
  }

  /** Random numbers come from a seed, by one kind of stream. */
  List<String> randomness(JavaClasses all) {
    return check(
        all,
        noClasses()
            .should()
            .dependOnClassesThat(assignableTo(Random.class))
            .orShould()
            .dependOnClassesThat(assignableTo(ThreadLocalRandom.class))
            .orShould()
            .callMethod(Math.class, "random")
            .orShould()
            .callMethod(StrictMath.class, "random")
            .orShould()
            .callMethod(Collections.class, "shuffle", List.class));
  }

  /** Results are kept as text, not as serialised objects. */
  List<String> serialisation(JavaClasses all) {
    return check(
        all,
        noClasses()
            .that()
            .areNotAssignableTo(Throwable.class)
            .and()
            .areNotAssignableTo(Enum.class)
            .should()
            .beAssignableTo(Serializable.class));
  }

  /** The packages with classes that do not say that nothing in them is null. */
  List<String> packagesNotNullMarked(JavaClasses all) {
    return all.stream()
        .map(JavaClass::getPackage)
        .distinct()
        .filter(p -> !p.isAnnotatedWith(NullMarked.class))
        .map(JavaPackage::getName)
        .sorted()
        .toList();
  }

  /** The public types of api that stand in no other. */
  List<String> publicApi(JavaClasses all) {
    return all.stream()
        .filter(resideInAnyPackage(in(Rooms.API)))
        .filter(type -> type.isTopLevelClass() && type.getModifiers().contains(JavaModifier.PUBLIC))
        .map(JavaClass::getName)
        .sorted()
        .toList();
  }

  private String in(String room) {
    return root + "." + room + "..";
  }

  private String[] in(Collection<String> rooms) {
    return Set.copyOf(rooms).stream().map(this::in).sorted().toArray(String[]::new);
  }

  private static List<String> check(JavaClasses all, ArchRule rule) {
    return rule.evaluate(all).getFailureReport().getDetails();
  }
}
