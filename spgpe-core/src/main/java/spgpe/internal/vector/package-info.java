/** Finds what needs the vector module of the JDK; not for use outside this project. */
@NullMarked
package spgpe.internal.vector;

import org.jspecify.annotations.NullMarked;
