// letters that do not come apart into a letter and a mark; the same as in the database's plain_text
const whole: Record<string, string> = {
  Ø: 'O',
  ø: 'o',
  Ł: 'L',
  ł: 'l',
  Đ: 'D',
  đ: 'd',
  ı: 'i',
  Æ: 'AE',
  æ: 'ae',
  Œ: 'OE',
  œ: 'oe',
}

/** Text as it is searched: without accents and in small letters, so that "Angstrom" finds "Ångström". */
export const plainText = (words: string): string =>
  words
    .replace(/[ØøŁłĐđıÆæŒœ]/g, (letter) => whole[letter] ?? letter)
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase()
