package benchtrue.sheet;

import benchtrue.model.Expression;

/**
 * A limit of operation that ties channels together: the expression must be at most zero, as {@code n*dp < 3.5e5} becomes
 * {@code n*dp − 3.5e5}.
 */
public record Joint(String text, Expression excess) {}
