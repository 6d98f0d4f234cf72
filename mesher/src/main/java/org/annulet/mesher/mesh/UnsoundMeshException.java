package org.annulet.mesher.mesh;

import java.util.List;

/** A mesh breaks a law; carries all findings. */
public final class UnsoundMeshException extends RuntimeException {
  private static final long serialVersionUID = 1L;
  private static final int SHOWN = 10;

  private final transient List<MeshCheck.Finding> findings;

  UnsoundMeshException(List<MeshCheck.Finding> findings) {
    super(message(findings));
    this.findings = List.copyOf(findings);
  }

  /** All findings, at least one. */
  public List<MeshCheck.Finding> findings() {
    return findings;
  }

  private static String message(List<MeshCheck.Finding> findings) {
    StringBuilder text = new StringBuilder();
    text.append("the mesh breaks a law in ").append(findings.size()).append(" places");
    for (MeshCheck.Finding finding : findings.subList(0, Math.min(SHOWN, findings.size()))) {
      text.append("\n    ").append(finding);
    }
    if (findings.size() > SHOWN) {
      text.append("\n    … and ").append(findings.size() - SHOWN).append(" more");
    }
    return text.append("\n    mend: the outline or file the mesh was made from").toString();
  }
}
