/**
 * Studies: what a case file asks for, carried out with the other modules. Never prints; says how
 * far it is through {@code Progress}.
 */
package org.annulet.cases.study;
