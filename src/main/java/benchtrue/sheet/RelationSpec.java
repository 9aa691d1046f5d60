package benchtrue.sheet;

import benchtrue.model.Relation;

/**
 * One equation with the settings that are its own.
 *
 * @param label how tables and events name it: the response as written, with {@code #k} behind it where it repeats
 * @param holdOutOutliers whether a reading beyond its bound is held out, or used and only counted
 * @param unknownIndex for each unknown of the relation its place in {@link Group#unknowns()}
 */
public record RelationSpec(Relation relation, String label, boolean holdOutOutliers, int[] unknownIndex) {}
