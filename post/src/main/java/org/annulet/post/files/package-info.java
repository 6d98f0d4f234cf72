/** Result files are written whole or not at all. No physics, no format. */
package org.annulet.post.files;
