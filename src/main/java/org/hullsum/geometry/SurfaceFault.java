package org.hullsum.geometry;

/** A surface that can't be built from what was stated; the reader of the case knows its place. */
public final class SurfaceFault extends Exception {
  private static final long serialVersionUID = 1L;

  private final String key;

  /**
   * @param key the key of the case format whose value is at fault
   * @param message what was found, what was expected and what to do
   */
  public SurfaceFault(String key, String message) {
    super(message, null, false, false);
    this.key = key;
  }

  public String key() {
    return key;
  }
}
