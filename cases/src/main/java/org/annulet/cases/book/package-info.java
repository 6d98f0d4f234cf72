/**
 * The validation book: chambers whose modes are known from outside this project, solved from a case
 * file exactly as a user's case is, and compared value by value. A value passes when it lies inside
 * the error bar the program itself gave; a chamber passes when, besides, the certificate holds and
 * no mode is missing or too many.
 */
package org.annulet.cases.book;
