package spgpe.projector;

/** Copies kept modes to their places in other arrays and back, by runs of neighbours. Immutable. */
final class SlotRuns {
  private final int[] modes;
  private final int[] places;
  private final int[] lengths;
  private final int count;

  private SlotRuns(int[] modes, int[] places, int[] lengths, int count) {
    this.modes = modes;
    this.places = places;
    this.lengths = lengths;
    this.count = count;
  }

  /** From the place at which the lanes of each mode begin. */
  static SlotRuns of(int[] placeOfMode, int lanes) {
    int[] modes = new int[placeOfMode.length];
    int[] places = new int[placeOfMode.length];
    int[] lengths = new int[placeOfMode.length];
    int count = 0;
    for (int m = 0; m < placeOfMode.length; m++) {
      if (m > 0 && placeOfMode[m] == placeOfMode[m - 1] + lanes) {
        lengths[count - 1] += lanes;
      } else {
        modes[count] = m * lanes;
        places[count] = placeOfMode[m];
        lengths[count] = lanes;
        count++;
      }
    }
    return new SlotRuns(modes, places, lengths, count);
  }

  void spread(double[] from, double[] slots) {
    for (int r = 0; r < count; r++) {
      System.arraycopy(from, modes[r], slots, places[r], lengths[r]);
    }
  }

  void collect(double[] slots, double[] to) {
    for (int r = 0; r < count; r++) {
      System.arraycopy(slots, places[r], to, modes[r], lengths[r]);
    }
  }

  /** One of several lanes of modes to slots of one lane. */
  void spread(double[] from, int lanes, int lane, double[] slots) {
    if (lanes == 1) {
      spread(from, slots);
      return;
    }
    for (int r = 0; r < count; r++) {
      for (int i = 0, m = modes[r] * lanes + lane; i < lengths[r]; i++, m += lanes) {
        slots[places[r] + i] = from[m];
      }
    }
  }

  /** Slots of one lane to one of several lanes of modes. */
  void collect(double[] slots, double[] to, int lanes, int lane) {
    if (lanes == 1) {
      collect(slots, to);
      return;
    }
    for (int r = 0; r < count; r++) {
      for (int i = 0, m = modes[r] * lanes + lane; i < lengths[r]; i++, m += lanes) {
        to[m] = slots[places[r] + i];
      }
    }
  }
}
