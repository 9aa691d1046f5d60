package benchtrue.model;

/**
 * A mistake in a text of the sheet, or a notice about it.
 *
 * @param column where in the text, counted from 0 in UTF-16 units; the text's length where something is missing at its end
 * @param message what is wrong, with the names and units concerned
 * @param remedy what to do about it
 */
public record Problem(int column, String message, String remedy) {}
