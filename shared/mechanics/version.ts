/** Version of the engine, stored with every analysis: any change that can move a figure raises it. */
export const engineVersion = '2.1.1'
