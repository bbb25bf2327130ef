package spgpe.fourier;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.Iterator;
import java.util.List;
import java.util.ServiceConfigurationError;
import java.util.ServiceLoader;
import spgpe.internal.check.Check;

/**
 * Finds Fourier providers. Order: by {@link FourierProvider#rank()}, highest first, then by name.
 *
 * <p>A provider that cannot be loaded on the running Java version (for example a class file that is
 * too new) is logged at level DEBUG and passed over. Nothing is cached. Thread-safe.
 */
public final class FourierProviders {
  private static final System.Logger LOG = System.getLogger(FourierProviders.class.getName());

  private FourierProviders() {}

  /**
   * All providers that load here, best first.
   *
   * @return unmodifiable list; holds at least the built-in provider
   */
  public static List<FourierProvider> available() {
    List<FourierProvider> found = new ArrayList<>();
    Iterator<FourierProvider> loader =
        ServiceLoader.load(FourierProvider.class, FourierProvider.class.getClassLoader())
            .iterator();
    while (true) {
      try {
        if (!loader.hasNext()) {
          break;
        }
        found.add(loader.next());
      } catch (ServiceConfigurationError | LinkageError e) {
        LOG.log(System.Logger.Level.DEBUG, "Fourier provider passed over: {0}", e.toString());
      }
    }
    found.sort(
        Comparator.comparingInt(FourierProvider::rank).reversed()
            .thenComparing(FourierProvider::name));
    return List.copyOf(found);
  }

  /**
   * The provider used when none is named.
   *
   * @return first of {@link #available()}
   * @throws IllegalStateException if none is on the class path
   */
  public static FourierProvider preferred() {
    List<FourierProvider> all = available();
    Check.state(!all.isEmpty(), "no Fourier provider on the class path: is spgpe-core complete?");
    return all.get(0);
  }

  /**
   * A provider by name.
   *
   * @param name provider name
   * @return the provider
   * @throws IllegalArgumentException if there is none of that name; the message lists those found
   */
  public static FourierProvider named(String name) {
    List<String> names = new ArrayList<>();
    for (FourierProvider provider : available()) {
      if (provider.name().equals(name)) {
        return provider;
      }
      names.add(provider.name());
    }
    throw new IllegalArgumentException(
        "no Fourier provider of that name: name=" + name + ", available=" + names);
  }
}
