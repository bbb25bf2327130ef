/** The coherent region (which modes are kept), the state on it, and the way between modes and positions. */
@NullMarked
package spgpe.projector;

import org.jspecify.annotations.NullMarked;
