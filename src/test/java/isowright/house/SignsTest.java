package isowright.house;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Every package has a sign that says what comes in, what goes out and what does not belong. */
class SignsTest {

  @Test
  void everyPackageHasASign() throws IOException {
    List<Path> rooms;
    try (Stream<Path> all = Files.walk(Path.of("src/main/java/isowright"), 1)) {
      rooms = all.skip(1).filter(Files::isDirectory).toList();
    }
    assertThat(rooms).hasSizeGreaterThanOrEqualTo(11);
    for (Path room : rooms) {
      String sign = Files.readString(room.resolve("package-info.java"));
      assertThat(sign.replaceAll("\\s*\\*?\\s+", " "))
          .as(room.toString())
          .contains(
              "Comes in:", "Goes out:", "Read first:", "Does not belong here:", "@NullMarked");
    }
  }
}
