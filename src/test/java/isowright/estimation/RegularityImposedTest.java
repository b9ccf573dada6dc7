package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.Regularity;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class RegularityImposedTest {
  @Test
  void metals() {
    Panel panel = PanelFixtures.primaryMetals();
    for (var where : Specification.RegularityImposed.values()) {
      for (boolean scaled : new boolean[] {true, false}) {
      Specification s = new Specification(Form.named("translog"), Specification.PlantEffects.NONE, Specification.Time.NONE, scaled, Specification.StandardErrors.CLASSICAL, .95).with(where);
      long t = System.nanoTime();
      Fit fit = Estimation.fit(panel, s);
      System.err.println(where + " " + fit.state() + " " + fit.reasons() + (System.nanoTime() - t) / 1e6);
      if (fit.state().usable()) {
        System.err.println(Arrays.toString(fit.numbers().parameters()) + " " + fit.numbers().linear().ssr());
        double[][] logs = panel.logQuantities().stream().map(c -> c.toArray()).toArray(double[][]::new);
        System.err.println(Regularity.count(fit.numbers().technology(), logs, panel.rows()));
        if (fit.numbers().particulars() instanceof Particulars.OfRegularity r) System.err.println(r.binding()+" "+r.withoutProduct()+" "+r.straight()+" w"+r.watched()+" d"+r.distance()+" k"+r.departure()+" "+r.starts()+" "+r.agreeing());
      }
      }
    }
  }
}
