/** Which of `0 … count - 1` belong together. */
export class Union {
  private readonly parents: number[];

  constructor(count: number) {
    this.parents = Array.from({ length: count }, (_, i) => i);
  }

  rootOf(member: number): number {
    let at = member;
    while (this.parents[at] !== at) {
      this.parents[at] = this.parents[this.parents[at]!]!;
      at = this.parents[at]!;
    }
    return at;
  }

  /** Whether they were apart until now. */
  join(a: number, b: number): boolean {
    const [one, other] = [this.rootOf(a), this.rootOf(b)];
    if (one === other) return false;
    this.parents[Math.max(one, other)] = Math.min(one, other);
    return true;
  }
}
