import type { FileStyle } from '../synthetic/file-styles.ts'
import { fileStyles } from '../synthetic/file-styles.ts'

export interface DemoSquad {
  name: string
  /** Name of the account that coaches it. */
  coach: string
  place: string
  /** How the program beside its plates writes files and names them. */
  style: FileStyle
  fileName: (athlete: string, date: string, n: number) => string
  athletes: string[]
}

const plainLetters = (text: string) =>
  text
    .replace(/Ł/g, 'L')
    .replace(/ł/g, 'l')
    .normalize('NFKD')
    .replace(/[^\w -]/g, '')
const lastFirst = (name: string) => {
  const words = plainLetters(name).toLowerCase().split(' ')
  return [words.at(-1), ...words.slice(0, -1)].join('_')
}

/** Three squads of fifteen invented people. */
export const demoSquads: DemoSquad[] = [
  {
    name: 'Sprints and hurdles',
    coach: 'Hetty Marlowe-Voss',
    place: 'Indoor hall',
    style: fileStyles.plain,
    fileName: (athlete, _date, n) => `${lastFirst(athlete)}_${n}.csv`,
    athletes: [
      'Mara Ostrow',
      'Tomi Halvarden',
      'Zoë Łukarek',
      'Amadi Nwoyeh',
      'Priya Sandhalli',
      'Callum Brackwith',
      'Inés Valderroja',
      'Yusuf Karadanli',
      'Freya Tollander',
      'Kofi Ansemba',
      'Linnea Åkervik',
      'Rhys Penmorrow',
      'Aiko Tanemura',
      'Sofia Brunellesi',
      'Declan O’Farrowe',
    ],
  },
  {
    name: 'Jumps',
    coach: 'Dayo Akinlade-Brook',
    place: 'Jumps pit',
    style: fileStyles.semicolon,
    fileName: (athlete, date, n) => `${athlete} ${date} (${n}).txt`,
    athletes: [
      'Noor Elbadrin',
      'Jonas Wiedmarck',
      'Chidera Obiakwe',
      'Hana Kovářová',
      'Lucía Montferrer',
      'Ravi Deshmukar',
      'Elin Sjövall-Berg',
      'Marek Zielonka',
      'Thandi Mkhondo',
      'Owen Tredinnock',
      'Mei Lanzhou',
      'Rosa Ferreiro-Dias',
      'Ivo Petrushin',
      'Adaeze Nnamorah',
      'Finn Oldershaw',
    ],
  },
  {
    name: 'Throws and combined',
    coach: 'Matteo Lindqvar',
    place: 'Throws cage',
    style: fileStyles.tabbed,
    fileName: (athlete, _date, n) => `${plainLetters(athlete).replace(/[ -]/g, '')}-CMJ-${n}.tsv`,
    athletes: [
      'Imke Sandvoort',
      'Kwame Ossuntu',
      'Bruno Castagnola',
      'Saoirse Kinvarra',
      'Leila Hosseinpur',
      'Viktor Dragomirov',
      'Nia Pembertree',
      'Anders Holmqvick',
      'Fatou Diarrassou',
      'Gus Wetherlam',
      'Camila Restrevo',
      'Takumi Hoshigawa',
      'Edda Brynjarsen',
      'Samir Boukhallad',
      'Poppy Aldermoor',
    ],
  },
]
