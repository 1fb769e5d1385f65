declare const proof: unique symbol;

/**
 * Someone who may act, proven so by this room. Every read and write of a service room takes one first; only the
 * functions of this room can make one, so code that has not asked who acts does not compile.
 */
export interface Actor {
  readonly [proof]: true;
  /** How the person is named beside whatever they do. */
  readonly name: string;
}

/** The one place where an `Actor` comes into being. */
export function provenActor(name: string): Actor {
  return { name } as Actor;
}
