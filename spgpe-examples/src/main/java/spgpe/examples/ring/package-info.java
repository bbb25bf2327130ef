/** The main job as a command: decay of a metastable relative phase in a ring waveguide. */
@NullMarked
package spgpe.examples.ring;

import org.jspecify.annotations.NullMarked;
