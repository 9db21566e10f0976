/** Elastic, perfectly plastic steel (common practice): Es eps, not beyond +-fy. MPa. */
export function computeElasticPlasticStress(fy: number, Es: number, eps: number): number {
  return Math.max(-fy, Math.min(fy, Es * eps))
}

export function computeElasticPlasticTangent(fy: number, Es: number, eps: number): number {
  return Math.abs(Es * eps) < fy ? Es : 0
}
