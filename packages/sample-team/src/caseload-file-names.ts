/** Invented names of many tongues for the caseload file; no name belongs to a real child. */
export interface Tongue {
  readonly girls: readonly string[];
  readonly boys: readonly string[];
  readonly families: readonly string[];
  readonly language: string;
}

export const tongues: readonly Tongue[] = [
  {
    language: 'English',
    girls: ['Isla', 'Freya', 'Maisie', 'Elodie', 'Wren', 'Tabitha', 'Orla', 'Beatrix'],
    boys: ['Rowan', 'Alfie', 'Jasper', 'Callum', 'Finley', 'Edmund', 'Kit', 'Barnaby'],
    families: [
      'Ashdown',
      'Fenwick',
      'Larkspur',
      'Marlowe',
      'Penhale',
      'Quill',
      'Thistlewood',
      'Wetherby',
      'O’Dowd',
      'Harker',
    ],
  },
  {
    language: 'Polish',
    girls: ['Łucja', 'Zofia', 'Małgorzata', 'Hanna', 'Wiśka', 'Jagoda'],
    boys: ['Tomasz', 'Błażej', 'Michał', 'Ignacy', 'Stanisław', 'Kuba'],
    families: ['Żółtowska', 'Wójcik', 'Dąbek', 'Krzyżan', 'Śliwa', 'Gołębiewski', 'Brzęczyk', 'Ząbek'],
  },
  {
    language: 'Vietnamese',
    girls: ['Thị Mai', 'Ngọc Ánh', 'Bích Thủy', 'Hồng', 'Quỳnh'],
    boys: ['Văn Đức', 'Minh Tuấn', 'Quang', 'Hữu Phước', 'Đăng'],
    families: ['Nguyễn', 'Trần', 'Đặng', 'Phạm', 'Huỳnh', 'Võ', 'Đỗ', 'Lương'],
  },
  {
    language: 'Somali',
    girls: ['Hodan', 'Ifrah', 'Sahra', 'Ayaan', 'Nimco'],
    boys: ['Abdirahman', 'Guled', 'Liban', 'Maxamed', 'Warsame'],
    families: ['Cabdi Xasan', 'Faarax', 'Jaamac', 'Nuur Cali', 'Warfaa', 'Axmed Diiriye', 'Guuleed'],
  },
  {
    language: 'Arabic',
    girls: ['ليلى', 'مريم', 'Noor', 'Yasmin', 'سارة'],
    boys: ['يوسف', 'Karim', 'عمر', 'Hadi', 'Sami'],
    families: ['الخطيب', 'Al-Masri', 'حداد', 'Bin Saleh', 'العلي', 'Nassar', 'Qabbani'],
  },
  {
    language: 'Yoruba',
    girls: ['Amara', 'Ṣadé', 'Ìyanu', 'Temitọpe', 'Fọlákẹ́'],
    boys: ['Ayọ̀délé', 'Kọ́lá', 'Tunde', 'Ọlámide', 'Segun'],
    families: ['Adébáyọ̀', 'Okonjo', 'Ọláwálé', 'Fashọlá', 'Ogunbanjo', 'Adéyẹmí'],
  },
  {
    language: 'Tamil',
    girls: ['Kavya', 'Malar', 'நிலா', 'Yazhini', 'Oviya'],
    boys: ['Arun', 'Kathir', 'கவின்', 'Senthil', 'Iniyan'],
    families: ['Murugesan', 'Selvaraj', 'Thirunavukkarasu', 'Palaniappan', 'Kandasamy', 'Ilango'],
  },
  {
    language: 'Portuguese',
    girls: ['Inês', 'Conceição', 'Leonor', 'Lua', 'Benedita'],
    boys: ['João', 'Simão', 'Tomé', 'Gonçalo', 'Caetano'],
    families: ['da Conceição Brandão', 'Araújo', 'Magalhães', 'Simões', 'de Sá', 'Falcão', 'Queirós'],
  },
];
