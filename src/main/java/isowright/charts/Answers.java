package isowright.charts;

import isowright.study.Figure;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** The words about a least-cost answer that its three charts share. */
final class Answers {

  private Answers() {}

  /** "Plan 2025, ces". */
  static String subject(Planned plan) {
    return plan.question() + ", " + plan.technology();
  }

  /** The inputs in their order. */
  static List<String> inputs(Planned plan) {
    return List.copyOf(plan.prices().keySet());
  }

  /** "CES", with what must be said of the answer beside it: "CES, outside the records". */
  static String who(Planned plan) {
    String technology = Words.sentence(Words.technology(plan.technology()));
    return switch (plan.status()) {
      case "corner" -> technology + ", at a limit";
      case "outside-records" -> technology + ", outside the records";
      case "irregular" -> technology + ", irregular here";
      default -> technology;
    };
  }

  /** "labour 41,300 h, machines 20,100 h and energy 63,400 GJ". */
  static String mix(Planned plan, Setting setting) {
    List<String> parts = new ArrayList<>();
    plan.mix()
        .forEach(
            (input, figure) -> parts.add(input + " " + quantity(input, figure.value(), setting)));
    return Words.list(parts);
  }

  /** "41,300 h". */
  static String quantity(String input, double value, Setting setting) {
    return Words.with(Numbers.brief(value), Words.unit(setting.units(), input));
  }

  /** "52,000 t". */
  static String output(double value, Setting setting) {
    return Words.with(Numbers.stated(value), setting.units().output());
  }

  /** "labour (h)". */
  static String heading(String input, Setting setting) {
    return Words.heading(input, Words.unit(setting.units(), input));
  }

  /** What limits the answer: " Machines held at 14,000 h.", or nothing. */
  static String limits(Planned plan) {
    StringBuilder words = new StringBuilder();
    for (Map.Entry<String, String> limit : plan.limits().entrySet()) {
      words.append(' ').append(Words.sentence(limit.getKey())).append(' ');
      words.append(limit.getValue()).append('.');
    }
    return words.toString();
  }

  /** The quantity of an input in the mix; NaN where there is none. */
  static double value(Planned plan, String input) {
    Figure figure = plan.mix().get(input);
    return figure == null ? Double.NaN : figure.value();
  }
}
