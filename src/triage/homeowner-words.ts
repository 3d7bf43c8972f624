/** The edition says "receptacle"; homeowners read "outlet". The page itself says "outlet (receptacle)" once. */
export const inHomeownerWords = (text: string): string =>
  text.replace(/receptacle/g, 'outlet').replace(/Receptacle/g, 'Outlet')
