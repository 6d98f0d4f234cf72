package org.annulet.post.meaning;

/**
 * Azimuthal order with its sense.
 *
 * @param value m of the stronger of e^{imθ} and e^{−imθ}
 */
record SignedOrder(int value) {}
