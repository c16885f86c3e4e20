/** A breath between two looks at something that another process is about to do. */
export const pause = (ms = 50) => new Promise((done) => setTimeout(done, ms))
