package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class LogRootTest {

  @Test
  void findsTheRootOfACurvedFunction() {
    LogRoot root = LogRoot.from(x -> Math.exp(x) + x * x * x - 7, 0, 5);
    assertThat(root.state()).isEqualTo(LogRoot.State.FOUND);
    double x = root.at();
    // The search ends when the root is known to 1e-12 or the function is that small.
    assertThat(Math.exp(x) + x * x * x).isCloseTo(7, within(1e-10));
  }

  @Test
  void goesDownAsWellAsUp() {
    LogRoot root = LogRoot.from(x -> x + 3, 0, -10);
    assertThat(root.at()).isCloseTo(-3, within(1e-11));
  }

  @Test
  void endsAtTheBoundWhereNothingCrosses() {
    LogRoot root = LogRoot.from(x -> 1 + Math.exp(-x), 0, 4.6);
    assertThat(root.state()).isEqualTo(LogRoot.State.BOUND);
    assertThat(root.at()).isEqualTo(4.6);
    assertThat(root.value()).isEqualTo(1 + Math.exp(-4.6));
  }

  @Test
  void endsWhereTheFunctionDoes() {
    LogRoot root = LogRoot.from(x -> x < 1 ? 2 - x : Double.NaN, 0, 3);
    assertThat(root.state()).isEqualTo(LogRoot.State.NO_VALUE);
    assertThat(root.at()).isBetween(.98, 1.0);
  }

  @Test
  void startsAtTheRoot() {
    assertThat(LogRoot.from(x -> x, 0, 3).state()).isEqualTo(LogRoot.State.FOUND);
  }
}
