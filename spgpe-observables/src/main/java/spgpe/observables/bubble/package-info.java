/** Decay of a metastable state: bubbles, their walls, and what the state was like before. */
@NullMarked
package spgpe.observables.bubble;

import org.jspecify.annotations.NullMarked;
