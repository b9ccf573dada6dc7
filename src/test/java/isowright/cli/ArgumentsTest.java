package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Mistakes in arguments: what is wrong, what could be meant, exit code 2, nothing on output. */
class ArgumentsTest {

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          chekc                  | `chekc` is not a command; the nearest is `check`. Commands: draft, check, run, plan, verify, compare, help. | isowright help
          zzz                    | `zzz` is not a command. Commands: draft, check, run, plan, verify, compare, help.                           | isowright help
          --verison              | `--verison` is not an option of `isowright`; the nearest is `--version`.             | isowright help
          help rnu               | `rnu` is not a command; the nearest is `run`.                                        | isowright help
          run                    | `run` lacks STUDY.                                                                   | isowright help run
          check                  | `check` lacks STUDY.                                                                 | isowright help check
          draft                  | `draft` lacks RECORDS.                                                               | isowright help draft
          run --intoo a b.yaml   | `--intoo` is not an option of `run`; the nearest is `--into`. Options: --into        | isowright help run
          run --quite b.yaml     | `--quite` is not an option of `run`; the nearest is `--quiet`.                       | isowright help run
          check a.yaml b.yaml    | `b.yaml` is one argument too many for `check`.                                       | isowright help check
          run a --into b --into c| `--into` of `run` is given twice                                                     | isowright help run
          run a.yaml --into      | `run` lacks DIR after `--into`.                                                      | isowright help run
          """)
  void areTold(String line, String message, String readOn) {
    Invocation invocation = Invocation.of(line.split(" "));
    assertThat(invocation.err()).startsWith("isowright: ").contains(message);
    assertThat(invocation.err().strip()).endsWith("Read on with: " + readOn);
    assertThat(invocation.err().strip().lines()).hasSize(2);
    assertThat(invocation.out()).isEmpty();
    assertThat(invocation.code()).isEqualTo(2);
  }

  /** The numbers are a contract with scripts. */
  @Test
  void exitCodes() {
    assertThat(Arrays.stream(ExitCode.values()).map(code -> code + "=" + code.number()))
        .containsExactly("DONE=0", "DEFECT=1", "MISTAKE=2", "UNFIT=3", "DIFFERENT=4");
  }
}
