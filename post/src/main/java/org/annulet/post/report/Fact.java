package org.annulet.post.report;

/**
 * One line of the case as it was understood.
 *
 * @param topic group it belongs to ("gas")
 * @param name what is said
 * @param value the value in SI, with its unit
 */
public record Fact(String topic, String name, String value) {}
