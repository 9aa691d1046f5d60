package benchtrue.sheet;

import benchtrue.model.Expression;

/** A channel computed from channels; it follows the real ones in an observation, in the order of the sheet. */
public record Derived(String name, Expression expression) {}
