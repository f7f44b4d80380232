package blochbound.cli;

import picocli.CommandLine.IVersionProvider;

/** The version that the manifest of the program's jar states. */
final class VersionText implements IVersionProvider {
  @Override
  public String[] getVersion() {
    String version = VersionText.class.getPackage().getImplementationVersion();
    return new String[] {"blochbound " + (version == null ? "(built from sources)" : version)};
  }
}
