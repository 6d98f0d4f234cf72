/**
 * The mesh: nodes, triangles, named zones and named edges. All that the solver may see of the
 * mesher.
 */
package org.annulet.mesher.mesh;
