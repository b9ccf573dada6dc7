package isowright.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;
import picocli.CommandLine.IVersionProvider;

/** The version that the build wrote into the jar. */
final class Version implements IVersionProvider {

  @Override
  public String[] getVersion() {
    Properties properties = new Properties();
    try (InputStream in = Version.class.getResourceAsStream("/isowright/version.properties")) {
      if (in != null) {
        properties.load(in);
      }
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
    return new String[] {"isowright " + properties.getProperty("version", "unknown")};
  }
}
