export type Variables = Readonly<Record<string, string | undefined>>;

/** The settings cannot be used; the message holds one sentence for each that is wrong. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';
}

/** Reads variables and gathers what is wrong with them, so that one start shows every mistake. */
export class Reader {
  private readonly complaints: string[] = [];

  constructor(private readonly variables: Variables) {}

  complain(sentence: string): void {
    this.complaints.push(sentence);
  }

  /** @throws ConfigError when anything was wrong. */
  finish(): void {
    if (this.complaints.length > 0) throw new ConfigError(this.complaints.join('\n'));
  }

  textOrNull(name: string): string | null {
    return this.variables[name]?.trim() || null;
  }

  text(name: string, otherwise?: string): string {
    const text = this.textOrNull(name) ?? otherwise;
    if (text === undefined) this.complain(`${name} must be set.`);
    return text ?? '';
  }

  whole(name: string, { min, max, otherwise }: { min: number; max: number; otherwise: number }): number {
    const text = this.textOrNull(name);
    if (text === null) return otherwise;
    const number = /^\d+$/.test(text) ? Number(text) : NaN;
    if (number >= min && number <= max) return number;
    this.complain(`${name} must be a whole number from ${min} to ${max}.`);
    return otherwise;
  }

  choice<T extends string>(name: string, choices: readonly T[], otherwise: T): T {
    const text = this.textOrNull(name) ?? otherwise;
    const found = choices.find((c) => c === text);
    if (!found) this.complain(`${name} must be one of ${choices.join(', ')}.`);
    return found ?? otherwise;
  }

  url(name: string, schemes: readonly string[], otherwise?: string): string {
    const text = this.textOrNull(name) ?? otherwise;
    if (text === undefined) {
      this.complain(`${name} must be set.`);
      return '';
    }
    if (URL.canParse(text) && schemes.includes(new URL(text).protocol)) return text;
    // The value is not repeated: it may hold a password.
    this.complain(
      `${name} must be an address that starts with ${schemes.map((s) => `${s}//`).join(' or ')}.`,
    );
    return '';
  }

  secret(name: string, otherwise?: string): string {
    const text = this.text(name, otherwise);
    if (text !== '' && text.length < 32) this.complain(`${name} must have at least 32 characters.`);
    return text;
  }
}
