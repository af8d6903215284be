/** The warp a pick is thrown across: an end every 10 px, as far as any screen. What is too long is clipped by the box. */
export const throwEnds = Array.from({ length: 200 }, (_, index) => `M${index * 10 + 7} 0v14`).join('');
