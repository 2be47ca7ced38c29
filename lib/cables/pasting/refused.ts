/** Why a paste cannot be read; `asks` names the unit that would settle it. */
export class Refused extends Error {
  readonly asks: "frequencyUnit" | "lossUnit" | undefined;
  constructor(message: string, asks?: "frequencyUnit" | "lossUnit") {
    super(message);
    this.asks = asks;
  }
}
