/** Tables of modes: JSON, CSV, Markdown and the terminal. Units stand in the names. No physics. */
package org.annulet.post.table;
