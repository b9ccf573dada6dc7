// A walk through the demo from code. Build first (mvn -q -DskipTests package), then:
//   jshell --class-path target/isowright.jar notebooks-data/walk-through.jsh
// What stands behind ==> is what the line gives; a test holds every one of them to it.

import isowright.workbench.Workbench;
import java.nio.file.Path;

// Read: the demo's study and its records.
Workbench bench = Workbench.open(Path.of("notebooks-data/glassworks.yaml"));
bench.read().used()                                                          // ==> 180
bench.read().plants()                                                        // ==> 14

// Fit: every figure carries its standard error and interval.
var ces = bench.fit("ces");
var scale = ces.returnsToScale().get();
String.format("%.3f", scale.value())                                         // ==> 1.062
String.format("%.3f", scale.uncertainty().get().low())                       // ==> 1.026
String.format("%.3f", ces.substitution().get(0).figure().value())            // ==> 0.687

// Ask: constant returns are rejected.
bench.ask("ces", "constant-returns").p() < 0.01                              // ==> true

// Plan: what the study asked, and what it would cost at another wage.
var plan = bench.plan("Plan 2025, long run", "ces");
String.format("%,.0f", plan.cost().get().value())                            // ==> 9,352,595
var dearer = bench.with("""
    least-cost:
      - {name: Dearer hours, technology: [ces], target: 40000, prices: {labour: 40, machines: 74, energy: 10.5}}
    """.stripIndent());
String.format("%,.0f", dearer.plan("Dearer hours", "ces").mix().get("labour").value())   // ==> 90,441

// Other settings: the same study, plant effects taken as random.
var random = bench.with("estimation: {plant-effects: random, time: trend}\ntechnologies: [cobb-douglas]\nleast-cost: []");
random.fit("cobb-douglas").how().plantEffects()                              // ==> random

// Draw: a chart is a picture, its caption, and the data behind it.
var chart = bench.draw("profile-ces");
chart.svg().get().contains("<svg")                                            // ==> true
chart.header().size() > 1                                                    // ==> true
