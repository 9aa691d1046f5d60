package benchtrue.sheet;

import benchtrue.model.Forgetting;
import java.util.List;

/**
 * Relations that share an unknown, directly or through others, and are therefore estimated together with one memory. Most
 * sheets have one group of one relation.
 *
 * @param unknowns of all its relations, each once, in the order in which the equations name them
 */
public record Group(List<RelationSpec> relations, List<UnknownSpec> unknowns, Forgetting forgetting) {}
