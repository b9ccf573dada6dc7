package isowright.charts;

import isowright.study.Figure;
import isowright.study.PlanDetail.Change;
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

  /** What a plan seeks: "cost", "output" for a budget, "profit". */
  static String result(Planned plan) {
    return switch (plan.detail().goal()) {
      case "budget" -> "output";
      case "profit" -> "profit";
      default -> "cost";
    };
  }

  /** What is moved: "the price of labour", "the target". */
  static String moved(Change change) {
    return switch (change.what()) {
      case "price" -> "price of " + change.input();
      case "output-price" -> "price of output";
      default -> change.what();
    };
  }

  /** The output of a plan: as stated where it is a target, rounded where it was found. */
  static String planned(Planned plan, Setting setting) {
    return plan.detail().goal().equals("target")
        ? output(plan.target(), setting)
        : Words.with(Numbers.brief(plan.target()), setting.units().output());
  }

  /** "target 40,000 t", or "plan 38,400 t" where the output was found. */
  static String aim(Planned plan, Setting setting) {
    return (plan.detail().goal().equals("target") ? "target " : "plan ") + planned(plan, setting);
  }

  /** The finding of a plan: least cost for a target, most output for a budget, most profit. */
  static String finding(Planned plan, Setting setting) {
    String money = setting.units().money();
    String output = planned(plan, setting);
    double stated = plan.detail().stated().orElse(Double.NaN);
    return switch (plan.detail().goal()) {
      case "budget" -> "the most output for " + Numbers.money(stated, money) + " is " + output;
      case "profit" ->
          "profit is greatest at "
              + output
              + plan.detail().profit().map(p -> ", " + Numbers.money(p.value(), money)).orElse("");
      default ->
          "least cost for "
              + output
              + plan.cost().map(c -> " is " + Numbers.money(c.value(), money)).orElse("");
    };
  }
}
