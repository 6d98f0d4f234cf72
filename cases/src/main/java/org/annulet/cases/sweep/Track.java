package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.List;
import org.annulet.cases.study.PointMode;

/** One mode along a line of points. */
final class Track {
  private final int number;
  private final int first;
  private final List<PointMode> modes = new ArrayList<>();

  Track(int number, int first, PointMode mode) {
    this.number = number;
    this.first = first;
    modes.add(mode);
  }

  void add(PointMode mode) {
    modes.add(mode);
  }

  /** Counted from 1, by the point where it begins and then by frequency. */
  int number() {
    return number;
  }

  /** The first point it is at. */
  int first() {
    return first;
  }

  /** The last point it is at. */
  int last() {
    return first + modes.size() - 1;
  }

  PointMode at(int point) {
    return modes.get(point - first);
  }

  boolean holds(int point) {
    return first <= point && point <= last();
  }

  PointMode any() {
    return modes.get(0);
  }

  /** Operator it belongs to, in words; empty where the case has one only. */
  String part() {
    return any().part();
  }
}
