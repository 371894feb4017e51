declare module 'jstat' {
  const jstat: {
    readonly normal: { readonly inv: (p: number, mean: number, sd: number) => number }
    readonly poisson: { readonly pdf: (k: number, rate: number) => number; readonly cdf: (k: number, rate: number) => number }
  }
  export default jstat
}
