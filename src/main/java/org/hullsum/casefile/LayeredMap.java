package org.hullsum.casefile;

import java.util.AbstractMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;

/** Two maps seen as one, the upper hiding the lower, without copying either for a look-up. */
final class LayeredMap<V> extends AbstractMap<String, V> {
  private final Map<String, V> upper;
  private final Map<String, V> lower;

  LayeredMap(Map<String, V> upper, Map<String, V> lower) {
    this.upper = upper;
    this.lower = lower;
  }

  @Override
  public boolean containsKey(Object key) {
    return upper.containsKey(key) || lower.containsKey(key);
  }

  @Override
  public V get(Object key) {
    return upper.containsKey(key) ? upper.get(key) : lower.get(key);
  }

  @Override
  public Set<Entry<String, V>> entrySet() {
    Map<String, V> all = new LinkedHashMap<>(lower);
    all.putAll(upper);
    return all.entrySet();
  }
}
